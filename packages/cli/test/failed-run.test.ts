import { access, readdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type * as Engine from '@noonwell/engine';
import { DomainError, RunError } from '@noonwell/engine';
import { newScenario, serializeScenario } from '@noonwell/schema';
import { epwFile, syntheticYear } from '@noonwell/testkit';
import { runCommandLine, writeHourlyCsv } from '../src/index.js';
import { scratchFolder } from './noonwell.js';

// A sound input whose run fails cannot be made from outside, so the engine's run is put out of order here.
const failure = vi.hoisted(() => ({ error: new Error('unset') }));
vi.mock('@noonwell/engine', async (importOriginal) => ({
  ...(await importOriginal<typeof Engine>()),
  createYearRun: () => {
    throw failure.error;
  },
}));

let folder: string;
let remove: () => Promise<void>;
beforeEach(async () => {
  ({ folder, remove } = await scratchFolder());
});
afterEach(() => remove());

async function run(error: Error): Promise<{ exitCode: number; out: string; err: string }> {
  failure.error = error;
  await writeFile(join(folder, 'year.epw'), epwFile(syntheticYear()));
  await writeFile(join(folder, 'coil.json'), serializeScenario(newScenario()));
  let out = '';
  let err = '';
  const exitCode = await runCommandLine(
    ['run', 'coil.json', '--weather', 'year.epw', '--hourly', 'hours.csv'],
    {
      folder,
      out: (text) => (out += text),
      err: (text) => (err += text),
      isWatched: false,
    },
  );
  return { exitCode, out, err };
}

describe('a run that fails', () => {
  it('ends with 1 and names the part and the weather record, and leaves no table', async () => {
    const outcome = await run(new RunError('receiver', 4711, 'the face temperature has no solution'));
    expect(outcome).toEqual({
      exitCode: 1,
      out: '',
      err: 'The run failed in receiver, weather record 4712: the face temperature has no solution.\n',
    });
    await expect(access(join(folder, 'hours.csv'))).rejects.toThrow('ENOENT');
  });

  it('ends with 2 where the engine refuses the input, and with 1 on a fault of its own', async () => {
    expect(await run(new DomainError('step [min]', 7, 'a whole number of steps'))).toMatchObject({
      exitCode: 2,
      err: expect.stringMatching(/step \[min\] is 7; allowed: a whole number/) as string,
    });
    expect(await run(new TypeError('no such thing'))).toMatchObject({
      exitCode: 1,
      out: '',
      err: 'The command failed: no such thing\n',
    });
  });
});

describe('an hourly table that cannot be finished', () => {
  it('leaves the old one as it was and no half one', async () => {
    const path = join(folder, 'hours.csv');
    await writeFile(path, 'old');
    function* rows(): Generator<string> {
      yield 'heading\n';
      throw new Error('out of rows');
    }
    await expect(writeHourlyCsv(path, rows())).rejects.toThrow('out of rows');
    expect(await readFile(path, 'utf8')).toBe('old');
    expect(await readdir(folder)).toEqual(['hours.csv']);
  });
});
