import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { scenarioField, scenarioFields, type ScenarioField } from './fields.js';
import { defaultVariant, newScenario } from './new-scenario.js';
import { parseScenario, parseScenarioText, serializeScenario } from './parse-scenario.js';
import { RECEIVER_KINDS, receiverSchema } from './receivers/index.js';
import { toMachine } from './to-machine.js';

/** A plain copy of a default scenario with one value replaced at a dotted path. */
function changed(path: string, value: unknown, receiver: 'coil' | 'cell' = 'coil'): unknown {
  return placed(newScenario(receiver), path, value);
}

/** A plain copy of a document with one value replaced at a dotted path. */
function placed(original: unknown, path: string, value: unknown): unknown {
  const document: unknown = structuredClone(original);
  const keys = path.split('.');
  let place = document as Record<string, unknown>;
  for (const key of keys.slice(0, -1)) place = place[key] as Record<string, unknown>;
  place[keys.at(-1)!] = value;
  return document;
}

function problemsOf(document: unknown) {
  const result = parseScenario(document);
  return result.ok ? [] : result.problems;
}

describe('fields of a scenario', () => {
  it('names every number of both default scenarios once, with unit, range, help and source', () => {
    for (const receiver of RECEIVER_KINDS) {
      const leaves = leafPaths(newScenario(receiver)).filter((path) => !/^format/.test(path));
      for (const path of leaves) expect(scenarioField(path), path).toBeDefined();
    }
    const kinds: ScenarioField['kind'][] = ['number', 'integer', 'numberList'];
    const numbers = scenarioFields()
      .flatMap((field) => field.columns ?? [field])
      .filter(({ kind }) => kinds.includes(kind));
    for (const field of numbers) {
      expect(field.unit, field.path).not.toBe('');
      expect(field.help.length, field.path).toBeGreaterThan(10);
      expect(field.source, field.path).not.toBe('');
      expect(field.min, field.path).toBeLessThan(field.max!);
    }
  });

  it('shows a variant’s fields only under its choice', () => {
    expect(scenarioField('catch.receiver.coilUaWK')?.when).toEqual([
      { path: 'catch.receiver.kind', value: 'coil' },
    ]);
    expect(scenarioField('catch.receiver.secondary.transmittance')?.when).toEqual([
      { path: 'catch.receiver.kind', value: 'cell' },
      { path: 'catch.receiver.secondary.kind', value: 'mixingDuct' },
    ]);
  });

  it('gives the defaults of a variant for a form that switches to it', () => {
    expect(receiverSchema.parse(defaultVariant('catch.receiver', 'cell'))).toEqual(
      newScenario('cell').catch.receiver,
    );
    expect(defaultVariant('carryAndKeep.tank.surroundings', 'outdoors')).toEqual({ kind: 'outdoors' });
  });

  const numberFields = scenarioFields().filter(
    (field) => field.kind === 'number' || field.kind === 'integer',
  );
  /** A default scenario that has the field: each choice it stands under is switched to its variant. */
  const documentWith = ({ path, when }: ScenarioField, value: unknown): unknown =>
    [
      ...when.map((choice) => {
        const branch = choice.path.replace(/\.kind$/, '');
        return [branch, defaultVariant(branch, choice.value)] as const;
      }),
      [path, value] as const,
    ].reduce<unknown>((document, [place, put]) => placed(document, place, put), newScenario());

  it('refuses each number just outside its range, and NaN and infinities, naming the field', () => {
    for (const field of numberFields) {
      for (const bad of [field.min! - 1, field.max! + 1, NaN, Infinity, '5', null]) {
        const problems = problemsOf(documentWith(field, bad));
        expect(
          problems.map(({ path }) => path),
          `${field.path} = ${String(bad)}`,
        ).toContain(field.path);
      }
    }
  });
});

describe('documents that are refused', () => {
  it.each([
    ['a negative diameter', 'catch.dish.apertureDiameterM', -5],
    ['a receiver larger than the dish', 'catch.receiver.faceSideM', 4.9],
    ['a tank of 0 L', 'carryAndKeep.tank.volumeM3', 0],
    ['not a number', 'catch.dish.reflectance', NaN],
    ['a least flow above the greatest', 'carryAndKeep.pump.maxFlowKgS', 0.005],
    ['a pump that empties the tank within two minutes', 'carryAndKeep.pump.maxFlowKgS', 17],
    ['a set point above the limit', 'carryAndKeep.pump.outletLimitC', 90],
    ['a resume wind above the stow wind', 'catch.tracker.resumeWindMs', 20],
    ['no hour with a load', 'use.loads.0.hourlyWeights', Array<number>(24).fill(0)],
    ['23 hours', 'use.loads.0.hourlyWeights', Array<number>(23).fill(1)],
    ['two and a half layers', 'carryAndKeep.tank.layers', 2.5],
    ['a step that is not offered', 'simulation.stepMinutes', 7],
  ])('%s, at its field', (_name, path, value) => {
    const problems = problemsOf(changed(path, value));
    expect(problems.map((problem) => problem.path)).toContain(path);
    for (const problem of problems) expect(problem.message).not.toBe('');
  });

  it('a load that draws the tank within a minute', () => {
    expect(problemsOf(changed('use.loads.0.litresPerDay', 200_000)).length).toBe(0);
    const small = changed('carryAndKeep.tank.volumeM3', 0.3) as {
      use: { loads: { litresPerDay: number }[] };
    };
    small.use.loads[0]!.litresPerDay = 200_000;
    expect(problemsOf(small).map(({ path }) => path)).toEqual(['use.loads.0.litresPerDay']);
  });

  it('an inverter whose standing loss is more than its whole loss', () => {
    const problems = problemsOf(changed('catch.receiver.inverterEfficiency', 1, 'cell'));
    expect(problems.map(({ path }) => path)).toEqual(['catch.receiver.inverterStandingLossFraction']);
  });

  it('an unknown field, named', () => {
    expect(
      problemsOf(changed('catch.dish.colour', 'red'))
        .map((problem) => problem.message)
        .join(),
    ).toContain('colour');
  });

  it('a missing field: a scenario is complete, so that no later default changes an old result', () => {
    expect(problemsOf(changed('catch.dish.reflectance', undefined))[0]?.path).toBe('catch.dish.reflectance');
  });

  it('text that is not JSON, NaN written into it among them', () => {
    const text = serializeScenario(newScenario()).replace('0.95', 'NaN');
    const result = parseScenarioText(text);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.problems[0]?.message).toContain('not JSON');
  });

  it('anything else, without throwing', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => !parseScenario(value).ok));
  });
});

describe('a scenario as bytes', () => {
  it('is the same text whatever the order of its keys', () => {
    const scenario = newScenario('cell');
    const shuffled = JSON.parse(JSON.stringify(scenario), (_key, value: unknown) =>
      value && typeof value === 'object' && !Array.isArray(value)
        ? Object.fromEntries(Object.entries(value).reverse())
        : value,
    ) as typeof scenario;
    expect(serializeScenario(shuffled)).toBe(serializeScenario(scenario));
  });

  it('reads back to itself', () => {
    for (const receiver of RECEIVER_KINDS) {
      const result = parseScenarioText(serializeScenario(newScenario(receiver)));
      expect(result).toEqual({ ok: true, scenario: newScenario(receiver) });
    }
  });
});

describe('conversion to the engine', () => {
  it('turns milliradians, degrees, millimetres, litres, kilowatts and kilowatt-hours into SI', () => {
    const machine = toMachine(newScenario('coil'));
    expect(machine.dish.slopeErrorRad).toBeCloseTo(0.005, 12);
    expect(machine.tracker.azimuthSpanRad).toBeCloseTo((250 / 180) * Math.PI, 12);
    expect(machine.tracker.resumeAfterS).toBe(900);
    expect(machine.loop.pipe.boreM).toBeCloseTo(0.02, 12);
    expect(machine.loop.pressureDropPa).toBe(60_000);
    expect(machine.load.volumePerDayM3).toBe(1);
    expect(machine.load.boilerCapacityW).toBe(40_000);
    expect(machine.electricityUse.annualUseJ).toBeCloseTo(12_000 * 3.6e6, 0);
    expect(machine.stepS).toBe(300);
  });
});

function leafPaths(value: unknown, path = ''): string[] {
  const field = scenarioField(path);
  if (value === null || typeof value !== 'object' || field?.kind === 'numberList') return [path];
  return Object.entries(value).flatMap(([key, child]) =>
    leafPaths(child, path === '' ? key : `${path}.${key}`),
  );
}
