import { DomainError, HOURLY_CHANNELS, createYearRun } from '@noonwell/engine';
import { columnKeys } from '@noonwell/persistence';
import { newScenario } from '@noonwell/schema';
import { syntheticYear } from '@noonwell/testkit';
import { encodeWeatherYear } from '@noonwell/weather';
import { RunRefused, calculateRun, type StartYear } from '../src/jobs/run-year/calculate-run';
import { firstRecords } from './stage';

describe('the arithmetic of a run', () => {
  const weatherBytes = encodeWeatherYear(firstRecords(syntheticYear(), 24));
  const input = { document: newScenario(), weatherBytes };
  const refusal = (change: Partial<typeof input>, startYear: StartYear = createYearRun): string => {
    try {
      calculateRun({ ...input, ...change }, startYear);
    } catch (error) {
      if (error instanceof RunRefused) return error.message;
      throw error;
    }
    return 'was not refused';
  };

  it('reports progress that rises to 1 and gives every channel and tank layer', () => {
    const reports: number[] = [];
    const outcome = calculateRun(input, createYearRun, (progress) => reports.push(progress));
    expect(reports).toEqual([...reports].sort((a, b) => a - b));
    expect(reports.at(-1)).toBe(1);
    expect(reports.length).toBeGreaterThan(10);
    const layers = input.document.carryAndKeep.tank.layers;
    expect(columnKeys(outcome.columns)).toEqual([
      'startLocalMs',
      ...HOURLY_CHANNELS.map(({ key }) => key),
      ...Array.from({ length: layers }, (_, layer) => `tankLayer${String(layer)}`),
    ]);
  });

  it('gives the same bytes for the same input', () => {
    const [first, second] = [calculateRun(input, createYearRun), calculateRun(input, createYearRun)];
    expect(second.summary).toBe(first.summary);
    expect(Buffer.compare(second.columns, first.columns)).toBe(0);
  });

  it('refuses in a sentence: a field, a damaged weather year, an impossible machine', () => {
    const document = newScenario();
    document.catch.dish.apertureDiameterM = -1;
    expect(refusal({ document })).toMatch(/^The scenario cannot be run: catch\.dish\.apertureDiameterM: /);
    const damaged = Uint8Array.from(weatherBytes);
    damaged[100] = damaged[100]! ^ 1;
    expect(refusal({ weatherBytes: damaged })).toBe(
      'The weather year cannot be read: The stored weather year is damaged: its checksum does not fit. Upload its file again.',
    );
    const impossible: StartYear = () => {
      throw new DomainError('tank height [m]', 0, '0.3 to 10');
    };
    expect(refusal({}, impossible)).toBe(
      'The run cannot start: Tank height [m] is 0; allowed: 0.3 to 10. Correct it in the scenario or the weather year.',
    );
  });

  it('lets a fault of our own through as it is, to be tried again', () => {
    const fault: StartYear = () => {
      throw new TypeError('undefined is not a function');
    };
    expect(() => calculateRun(input, fault)).toThrow(TypeError);
  });
});
