import { describe, expect, it } from 'vitest';
import { defaultVariant, newScenario } from './new-scenario.js';
import { readMonthDay } from './outages.js';
import { parseScenario } from './parse-scenario.js';
import type { Scenario } from './scenario.js';
import { scenarioField } from './fields.js';
import { toMachine } from './to-machine.js';

function changed(change: (scenario: Scenario) => void): Scenario {
  const scenario = newScenario();
  change(scenario);
  return scenario;
}
const problemPaths = (scenario: Scenario): string[] => {
  const parsed = parseScenario(scenario);
  return parsed.ok ? [] : parsed.problems.map(({ path }) => path);
};

describe('horizon profile', () => {
  const withHorizon = (...pairs: (readonly [number, number])[]) =>
    changed((scenario) => {
      scenario.place.horizon = pairs.map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, elevationDeg }));
    });

  it('takes pairs in any order, up to 360 of them', () => {
    expect(problemPaths(withHorizon([200, 5], [90, 12.5], [0, 0]))).toEqual([]);
    const degrees = Array.from({ length: 361 }, (_, index) => [index * 0.9, 1] as const);
    expect(problemPaths(withHorizon(...degrees.slice(0, 360)))).toEqual([]);
    expect(problemPaths(withHorizon(...degrees))).toEqual(['place.horizon']);
  });

  it('refuses a direction that stands there twice, 360° beside 0° too, at its place', () => {
    expect(problemPaths(withHorizon([10, 1], [20, 2], [10, 3]))).toEqual(['place.horizon.2.azimuthDeg']);
    expect(problemPaths(withHorizon([0, 1], [360, 1]))).toEqual(['place.horizon.1.azimuthDeg']);
  });

  it('refuses what no horizon has', () => {
    expect(problemPaths(withHorizon([10, 91]))).toEqual(['place.horizon.0.elevationDeg']);
    expect(problemPaths(withHorizon([10, -1]))).toEqual(['place.horizon.0.elevationDeg']);
    expect(problemPaths(withHorizon([361, 1]))).toEqual(['place.horizon.0.azimuthDeg']);
    expect(problemPaths(withHorizon([NaN, 1]))).toEqual(['place.horizon.0.azimuthDeg']);
  });

  it('reaches the engine in radians', () => {
    const { horizon } = toMachine(withHorizon([90, 45])).place;
    expect(horizon).toHaveLength(1);
    expect(horizon[0]!.azimuthRad).toBeCloseTo(Math.PI / 2, 14);
    expect(horizon[0]!.elevationRad).toBeCloseTo(Math.PI / 4, 14);
  });

  it('has named columns, found by their path in any row', () => {
    expect(scenarioField('place.horizon')).toMatchObject({ kind: 'table', mostRows: 360 });
    expect(scenarioField('place.horizon.17.elevationDeg')).toMatchObject({ label: 'Elevation', unit: '°' });
  });
});

describe('scheduled outages', () => {
  const withOutages = (...ranges: (readonly [string, string])[]) =>
    changed((scenario) => {
      scenario.catch.outages = ranges.map(([from, to]) => ({ from, to }));
    });

  it('takes up to twelve ranges, over the new year too', () => {
    expect(problemPaths(withOutages(['03-01', '03-14'], ['12-20', '01-06'], ['02-29', '02-29']))).toEqual([]);
    const day = ['05-01', '05-01'] as const;
    expect(problemPaths(withOutages(...Array<typeof day>(12).fill(day)))).toEqual([]);
    expect(problemPaths(withOutages(...Array<typeof day>(13).fill(day)))).toEqual(['catch.outages']);
  });

  it.each(['', '3-1', '13-01', '00-10', '02-30', '04-31', '2024-03-01', '03/01', ' 03-01'])(
    'refuses %j as a day, at its field',
    (text) => {
      expect(readMonthDay(text)).toBeNull();
      expect(problemPaths(withOutages([text, '03-01']))).toEqual(['catch.outages.0.from']);
      expect(problemPaths(withOutages(['03-01', text]))).toEqual(['catch.outages.0.to']);
    },
  );

  it('reach the engine as month and day', () => {
    expect(toMachine(withOutages(['03-01', '11-30'])).outages).toEqual([
      { from: { month: 3, day: 1 }, to: { month: 11, day: 30 } },
    ]);
  });
});

describe('buried pipe', () => {
  const buried = defaultVariant('carryAndKeep.pipe', 'buried') as Scenario['carryAndKeep']['pipe'];

  it('is taken with its defaults and reaches the engine in SI', () => {
    const scenario = changed(({ carryAndKeep }) => {
      carryAndKeep.pipe = buried;
    });
    expect(problemPaths(scenario)).toEqual([]);
    expect(toMachine(scenario).loop.pipe).toMatchObject({ kind: 'buried', depthM: 0.8, boreM: 0.02 });
    const { pipe } = toMachine(scenario).loop;
    expect(pipe.kind === 'buried' && pipe.soilDiffusivityM2S).toBeCloseTo(6e-7, 15);
  });

  it('may not look out of the ground', () => {
    const shallow = changed(({ carryAndKeep }) => {
      carryAndKeep.pipe = { ...buried, depthM: 0.05, insulationMm: 100 } as typeof buried;
    });
    expect(problemPaths(shallow)).toEqual(['carryAndKeep.pipe.depthM']);
  });
});
