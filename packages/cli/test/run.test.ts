import { access, mkdir, readdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runYear } from '@noonwell/engine';
import {
  newScenario,
  runSummarySchema,
  serializeScenario,
  serializeSummary,
  summariseRun,
  toMachine,
} from '@noonwell/schema';
import { epwFile, lineOfRow, paddedEpwFile, pdfFile, syntheticYear } from '@noonwell/testkit';
import { noonwell, scratchFolder, writeScenario } from './noonwell.js';

const year = syntheticYear();
let folder: string;
let remove: () => Promise<void>;

beforeAll(async () => {
  ({ folder, remove } = await scratchFolder());
  await writeFile(join(folder, 'year.epw'), epwFile(year));
  await writeFile(join(folder, 'coil.json'), serializeScenario(newScenario('coil')));
  await writeFile(join(folder, 'cell.json'), serializeScenario(newScenario('cell')));
});
afterAll(() => remove());

const exists = (path: string) =>
  access(join(folder, path)).then(
    () => true,
    () => false,
  );

describe('a run', () => {
  it.each(['coil', 'cell'] as const)(
    'prints the summary of the %s scenario, the bytes that the library gives',
    async (receiver) => {
      const { exitCode, out, err } = await noonwell(folder, [
        'run',
        `${receiver}.json`,
        '--weather',
        'year.epw',
      ]);
      expect([exitCode, err]).toEqual([0, '']);
      expect(out).toBe(serializeSummary(summariseRun(runYear(toMachine(newScenario(receiver)), year))));
      const summary = runSummarySchema.parse(JSON.parse(out));
      expect(summary.heatDeliveredKwh).toBeGreaterThan(1000);
      expect(summary.powerAcKwh > 1000).toBe(receiver === 'cell');
      expect(summary.ledger.residualOfBeam).toBeLessThanOrEqual(1e-9);
    },
  );

  it('writes the hourly table, whose sums are those of the summary', async () => {
    const args = ['run', 'coil.json', '--weather', 'year.epw', '--step', '60', '--hourly', 'hours.csv'];
    const { exitCode, out } = await noonwell(folder, args);
    expect(exitCode).toBe(0);
    const summary = runSummarySchema.parse(JSON.parse(out));
    expect(summary.stepMinutes).toBe(60);

    const text = await readFile(join(folder, 'hours.csv'), 'utf8');
    const [heading = '', ...rows] = text.trimEnd().split('\n');
    const headings = heading.split(',');
    expect(rows).toHaveLength(8760);
    expect(headings[0]).toBe('start [local standard time UTC-02:00]');
    expect(headings.slice(1).every((name) => /^\w+ \[[^\]]+\]$/.test(name))).toBe(true);
    expect(new Set(rows.map((row) => row.split(',').length))).toEqual(new Set([headings.length]));
    expect([rows[0]!.slice(0, 16), rows[8759]!.slice(0, 16)]).toEqual([
      '2018-01-01T00:00',
      '2018-12-31T23:00',
    ]);

    const sumKwh = (name: string) => {
      const at = headings.indexOf(`${name} [W]`);
      expect(at).toBeGreaterThan(0);
      return rows.reduce((sum, row) => sum + Number(row.split(',')[at]), 0) / 1000;
    };
    for (const [line, kwh] of Object.entries(summary.ledger.lines)) {
      expect(Math.abs(sumKwh(line) - kwh), line).toBeLessThan(1e-6 + 1e-7 * Math.abs(kwh));
    }
    const air = headings.indexOf('dryBulbC [°C]');
    expect(Number(rows[100]!.split(',')[air])).toBe(year.dryBulbC[100]);
    expect((await readdir(folder)).filter((name) => name.includes('.part'))).toEqual([]);
  });

  it('tells doubts about the weather on standard error and goes on', async () => {
    await writeFile(join(folder, 'early.epw'), epwFile(year, { defects: [{ kind: 'shifted', hours: -1 }] }));
    const { exitCode, out, err } = await noonwell(folder, [
      'run',
      'coil.json',
      '--weather',
      'early.epw',
      '--step',
      '60',
    ]);
    expect(exitCode).toBe(0);
    expect(runSummarySchema.safeParse(JSON.parse(out)).success).toBe(true);
    expect(err).toMatch(/^Weather: The irradiance fits the sun best \+30 min/);
  });

  it("takes paths from the folder where npm was called, which is not npm's own", async () => {
    const elsewhere = join(folder, 'elsewhere');
    await mkdir(elsewhere);
    const env = { npm_lifecycle_event: 'noonwell', INIT_CWD: folder };
    const args = ['run', 'coil.json', '--weather', 'year.epw', '--step', '60'];
    expect(await noonwell(elsewhere, args, env)).toMatchObject({ exitCode: 0 });
    expect(await noonwell(elsewhere, args)).toMatchObject({ exitCode: 2 });
  });
});

describe('weather that is refused', () => {
  const row = 4000;
  const cell = (text: string) => epwFile(year, { defects: [{ kind: 'cell', row, cell: 15, text }] });
  it.each([
    [
      'truncated',
      () => epwFile(year, { defects: [{ kind: 'truncated', row, characters: 50 }] }),
      /Line 4009.*cut off[\s\S]*The file stops before 16 June/,
    ],
    [
      '8759 rows',
      () => epwFile(year, { defects: [{ kind: 'rowMissing', row }] }),
      /Line 4009: The hour 16 June, hour 17 is missing \(8759/,
    ],
    [
      'a double row',
      () => epwFile(year, { defects: [{ kind: 'rowDuplicated', row }] }),
      /Line 4010: This hour stands already in line 4009/,
    ],
    [
      'text where a number should be',
      () => cell('sunny'),
      /Line 4009, column 15 \(direct normal irradiation\): "sunny" is not a number/,
    ],
    ['negative irradiation', () => cell('-20'), /Line 4009, column 15 .*: -20 is negative/],
    ['missing irradiation', () => cell('9999'), /Line 4009, column 15 .*missing/],
    ['a PDF renamed .epw', pdfFile, /PDF document/],
    ['an empty file', () => new Uint8Array(0), /The file is empty/],
    ['65 MiB', () => paddedEpwFile(year, 65 * 1024 * 1024), /65\.0 MiB; at most 64 MiB/],
    [
      'a whole column missing',
      () => epwFile(year, { defects: [{ kind: 'column', cell: 14, text: '9999' }] }),
      /… and 8740 more problems/,
    ],
  ])('%s', async (name, file, sentence) => {
    expect(lineOfRow(row)).toBe(4009);
    const path = `${name.replace(/\W/g, '-')}.epw`;
    await writeFile(join(folder, path), file());
    const { exitCode, out, err } = await noonwell(folder, [
      'run',
      'coil.json',
      '--weather',
      path,
      '--hourly',
      'no.csv',
    ]);
    expect(err).toMatch(sentence);
    expect([exitCode, out]).toEqual([2, '']);
    expect(await exists('no.csv')).toBe(false);
  });

  it('a file that is not there, and a folder', async () => {
    const absent = await noonwell(folder, ['run', 'coil.json', '--weather', 'absent.epw']);
    expect(absent).toMatchObject({
      exitCode: 2,
      out: '',
      err: expect.stringMatching(/There is no weather file .*absent\.epw/) as string,
    });
    const isFolder = await noonwell(folder, ['run', 'coil.json', '--weather', '.']);
    expect(isFolder).toMatchObject({
      exitCode: 2,
      out: '',
      err: expect.stringMatching(/is not a file/) as string,
    });
  });
});

describe('scenarios that are refused', () => {
  it.each([
    ['a negative diameter', 'catch.dish.apertureDiameterM', -5, /catch\.dish\.apertureDiameterM: /],
    ['a receiver larger than the dish', 'catch.receiver.faceSideM', 4.5, /catch\.receiver\.faceSideM: /],
    ['a tank of 0 L', 'carryAndKeep.tank.volumeM3', 0, /carryAndKeep\.tank\.volumeM3: /],
    ['an unknown field', 'catch.dish.colour', 'blue', /catch\.dish: .*"colour"/],
    ['a missing number', 'catch.dish.focalRatio', null, /catch\.dish\.focalRatio: /],
  ])('%s', async (name, path, value, sentence) => {
    const file = `${name.replace(/\W/g, '-')}.json`;
    await writeScenario(join(folder, file), path, value);
    const { exitCode, out, err } = await noonwell(folder, ['run', file, '--weather', 'year.epw']);
    expect(err).toMatch(sentence);
    expect([exitCode, out]).toEqual([2, '']);
  });

  it.each([
    ['NaN', (text: string) => text.replace(/"reflectance": [\d.]+/, '"reflectance": NaN'), /not JSON/],
    ['half a file', (text: string) => text.slice(0, 200), /not JSON/],
    ['a weather file', () => new TextDecoder().decode(epwFile(year).subarray(0, 5000)), /not JSON/],
    ['a huge file', () => ' '.repeat(2_000_000), /2000000 bytes, which no scenario has/],
  ])('%s', async (name, change, sentence) => {
    const file = `${name.replace(/\W/g, '-')}.json`;
    await writeFile(join(folder, file), change(serializeScenario(newScenario())));
    const { exitCode, out, err } = await noonwell(folder, ['run', file, '--weather', 'year.epw']);
    expect(err).toMatch(sentence);
    expect([exitCode, out]).toEqual([2, '']);
  });

  it('lists every field that is wrong', async () => {
    const scenario = newScenario();
    const dish = { ...scenario.catch.dish, reflectance: 7, shadowFraction: -1 };
    await writeFile(
      join(folder, 'two.json'),
      JSON.stringify({ ...scenario, catch: { ...scenario.catch, dish } }),
    );
    const { err } = await noonwell(folder, ['run', 'two.json', '--weather', 'year.epw']);
    expect(err).toMatch(/catch\.dish\.reflectance: [\s\S]*catch\.dish\.shadowFraction: /);
  });
});

describe('a place for the hourly table that is refused before anything is calculated', () => {
  it.each([
    ['no/such/folder/hours.csv', /there is no folder/],
    ['.', /is not a file/],
    ['year.epw', /would overwrite .*year\.epw/],
    ['coil.json', /would overwrite .*coil\.json/],
  ])('%s', async (path, sentence) => {
    const { exitCode, out, err } = await noonwell(folder, [
      'run',
      'coil.json',
      '--weather',
      'year.epw',
      '--hourly',
      path,
    ]);
    expect(err).toMatch(sentence);
    expect([exitCode, out]).toEqual([2, '']);
    expect(await readFile(join(folder, 'coil.json'), 'utf8')).toBe(serializeScenario(newScenario('coil')));
  });
});
