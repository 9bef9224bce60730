import { copyFile, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { MODEL_VERSION } from '@noonwell/engine';
import { RECEIVER_KINDS, parseScenarioText, runSummarySchema, serializeSummary } from '@noonwell/schema';
import { epwFile, syntheticYear } from '@noonwell/testkit';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { noonwell, scratchFolder } from './noonwell.js';

/**
 * Scenarios exported in format version 1, with the summaries that the calculation of that time printed for them
 * (60-minute steps, Node 20): they run still, and as long as the model's version is the same, to the same bytes.
 */
const OLD = fileURLToPath(new URL('version-1/', import.meta.url));
const NODE_OF_THE_FIGURES = 20;

let folder: string;
let remove: () => Promise<void>;
beforeAll(async () => {
  ({ folder, remove } = await scratchFolder());
  await writeFile(join(folder, 'year.epw'), epwFile(syntheticYear()));
});
afterAll(() => remove());

describe.each(RECEIVER_KINDS)('a scenario of version 1 with a %s receiver', (receiver) => {
  it('is read, and written in the newest version from then on', async () => {
    const text = await readFile(join(OLD, `${receiver}.json`), 'utf8');
    expect(text).toContain('"formatVersion": 1');
    expect(parseScenarioText(text)).toMatchObject({
      ok: true,
      scenario: { formatVersion: 2, place: { horizon: [] }, carryAndKeep: { pipe: { kind: 'exposed' } } },
    });
  });

  it('gives the numbers that it gave', async () => {
    await copyFile(join(OLD, `${receiver}.json`), join(folder, `${receiver}.json`));
    const args = ['run', `${receiver}.json`, '--weather', 'year.epw', '--step', '60'];
    const { exitCode, out, err } = await noonwell(folder, args);
    expect([exitCode, err]).toEqual([0, '']);
    const then = await readFile(join(OLD, `${receiver}-summary.json`), 'utf8');
    const old = runSummarySchema.parse(JSON.parse(then));
    expect(old.modelVersion).toBe(MODEL_VERSION);
    if (process.version.startsWith(`v${NODE_OF_THE_FIGURES}.`)) {
      expect(out).toBe(serializeSummary(old));
      return;
    }
    // Another Node may have another sine: yearly totals within 1e-9 of the beam.
    const { ledger } = runSummarySchema.parse(JSON.parse(out));
    for (const [line, kwh] of Object.entries(ledger.lines)) {
      expect(Math.abs(kwh - old.ledger.lines[line as keyof typeof old.ledger.lines]), line).toBeLessThan(
        1e-9 * old.beamOnApertureKwh,
      );
    }
  });
});
