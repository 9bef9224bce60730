import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MODEL_VERSION } from '@noonwell/engine';
import {
  newScenario,
  parseScenarioText,
  RECEIVER_KINDS,
  scenarioFields,
  serializeScenario,
  summaryFigures,
} from '@noonwell/schema';
import { noonwell, scratchFolder } from './noonwell.js';

let folder: string;
let remove: () => Promise<void>;
beforeAll(async () => {
  ({ folder, remove } = await scratchFolder());
});
afterAll(() => remove());

describe('help and version', () => {
  it('prints both commands and the exit codes', async () => {
    const { exitCode, out, err } = await noonwell(folder, ['--help']);
    expect([exitCode, err]).toEqual([0, '']);
    expect(out).toContain('noonwell run SCENARIO.json --weather FILE');
    expect(out).toContain('noonwell scenario new');
    expect(out).toMatch(/0 done, 1 the run failed, 2/);
  });

  it('documents every key of the summary with its unit', async () => {
    const { exitCode, out } = await noonwell(folder, ['run', '--help']);
    expect(exitCode).toBe(0);
    expect(summaryFigures().length).toBeGreaterThan(40);
    for (const { path, description } of summaryFigures()) {
      expect(out).toContain(path);
      expect(out).toContain(description);
    }
    expect(out).toMatch(/^ +heatDeliveredKwh +kWh +\S/m);
    expect(out).toMatch(/^ +cellMaxC +°C +.*null where/m);
    expect(out).toMatch(/^ +ledger\.residualOfBeam +- +\S/m);
  });

  it('documents every field of a scenario', async () => {
    const { exitCode, out } = await noonwell(folder, ['scenario', '--help']);
    expect(exitCode).toBe(0);
    for (const { path } of scenarioFields()) expect(out).toContain(path);
    expect(out).toMatch(/^ +catch\.dish\.apertureDiameterM +m +[\d.]+ to [\d.]+ +\S/m);
  });

  it('prints its version and that of the calculation', async () => {
    const { exitCode, out } = await noonwell(folder, ['--version']);
    expect(exitCode).toBe(0);
    expect(out).toMatch(/^noonwell \d+\.\d+\.\d+, calculation /);
    expect(out).toContain(MODEL_VERSION);
  });
});

describe('what cannot be understood', () => {
  it.each([
    [[], /A command is needed/],
    [['fly'], /There is no command "fly"; there are: run, scenario/],
    [['constructor'], /There is no command "constructor"/],
    [['run'], /A scenario file is needed/],
    [['run', 'a.json'], /A weather file is needed: --weather FILE/],
    [['run', 'a.json', 'b.json', '--weather', 'c.epw'], /One scenario file is run at a time; 2 are named/],
    [['run', 'a.json', '--weather'], /--weather/],
    [['run', 'a.json', '--wether', 'c.epw'], /--wether/],
    [
      ['run', 'a.json', '--weather', 'c.epw', '--step', '7'],
      /A step of "7" minutes is not possible; possible: 60, 30/,
    ],
    [['scenario'], /What to do with a scenario is missing/],
    [['scenario', 'burn'], /"scenario burn" is not known/],
    [['scenario', 'new', '--receiver', 'kettle'], /There is no receiver "kettle"; there are: coil, cell/],
  ])('%j ends with 2 and a sentence', async (args, sentence) => {
    const { exitCode, out, err } = await noonwell(folder, args);
    expect(exitCode).toBe(2);
    expect(out).toBe('');
    expect(err).toMatch(sentence);
    expect(err).not.toMatch(/ at .*\.ts:|node:internal/);
  });
});

describe('scenario new', () => {
  it.each(RECEIVER_KINDS)('prints the complete default scenario with a %s receiver', async (receiver) => {
    const { exitCode, out, err } = await noonwell(folder, ['scenario', 'new', '--receiver', receiver]);
    expect([exitCode, err]).toEqual([0, '']);
    expect(out).toBe(serializeScenario(newScenario(receiver)));
    expect(parseScenarioText(out)).toMatchObject({ ok: true });
  });

  it('takes the coil receiver unless told otherwise', async () => {
    const { out } = await noonwell(folder, ['scenario', 'new']);
    expect(out).toBe(serializeScenario(newScenario('coil')));
  });
});
