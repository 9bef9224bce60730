import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { accessSchema, pageOf, studySchema, studySummarySchema } from '@noonwell/schema';

const base = process.env['NOONWELL_E2E_URL'] ?? '';
let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'noonwell-export-'));
});
afterAll(() => rm(folder, { recursive: true }));

async function signIn(): Promise<(path: string) => Promise<Response>> {
  const answer = await fetch(`${base}/api/auth/demo-sign-in`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: base },
    body: JSON.stringify({ role: 'engineer' }),
  });
  const { accessToken } = accessSchema.parse(await answer.json());
  return async (path) => {
    const response = await fetch(`${base}/api${path}`, {
      headers: { authorization: `Bearer ${accessToken}` },
    });
    expect(response.status, path).toBe(200);
    return response;
  };
}

it('a scenario exported from the app, run by the command line on the exported weather file, gives the bytes of the app’s summary', async () => {
  const get = await signIn();
  const list = pageOf(studySummarySchema).parse(await (await get('/studies')).json());
  const demo = list.items.find((study) => study.name === 'Brackenfold Creamery');
  const study = studySchema.parse(await (await get(`/studies/${demo?.id}`)).json());
  const run = promisify(execFile);
  let compared = 0;
  for (const { latestRun, versionId, weatherYearId, position } of study.scenarios) {
    if (latestRun?.state !== 'done') continue;
    const scenarioFile = join(folder, `scenario-${position}.json`);
    const weatherFile = join(folder, `weather-${position}.epw`);
    await writeFile(scenarioFile, await (await get(`/scenario-versions/${versionId}/export`)).text());
    const original = await (await get(`/weather-years/${weatherYearId}/original`)).arrayBuffer();
    await writeFile(weatherFile, Buffer.from(original));
    const summary = await (await get(`/runs/${latestRun.id}/summary`)).text();
    const cli = ['--conditions=@noonwell/source', '--import', 'tsx', 'packages/cli/src/main.ts'];
    const { stdout } = await run(process.execPath, [...cli, 'run', scenarioFile, '--weather', weatherFile]);
    expect(stdout).toBe(summary);
    compared++;
  }
  expect(compared).toBeGreaterThan(0);
});
