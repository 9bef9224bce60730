import { describe, expect, it } from 'vitest';
import { newScenario } from './new-scenario.js';
import { parseScenario, serializeScenario } from './parse-scenario.js';
import { SCENARIO_FORMAT_VERSION } from './scenario-format.js';
import { scenarioSchema } from './scenario.js';
import { upgradeScenario } from './upgrade.js';

/** A document as version 1 wrote it. */
function version1(receiver: 'coil' | 'cell' = 'coil') {
  const { place: _place, ...rest } = newScenario(receiver);
  const { outages: _outages, ...caught } = rest.catch;
  const { kind: _kind, ...pipe } = rest.carryAndKeep.pipe;
  return {
    ...rest,
    formatVersion: 1,
    catch: caught,
    carryAndKeep: { ...rest.carryAndKeep, pipe },
  };
}

describe('a document of version 1', () => {
  it.each(['coil', 'cell'] as const)(
    'reads as a level horizon, exposed pipe and no outage (%s)',
    (receiver) => {
      expect(parseScenario(version1(receiver))).toEqual({ ok: true, scenario: newScenario(receiver) });
      expect(serializeScenario(scenarioSchema.parse(version1(receiver)))).toBe(
        serializeScenario(newScenario(receiver)),
      );
    },
  );

  it('is left as it was itself: stored versions never change', () => {
    const stored = version1();
    const before = JSON.stringify(stored);
    upgradeScenario(stored);
    expect(JSON.stringify(stored)).toBe(before);
  });

  it('keeps its own faults, each named at its field', () => {
    const faulty = version1();
    const parsed = parseScenario({
      ...faulty,
      carryAndKeep: { ...faulty.carryAndKeep, pipe: { ...faulty.carryAndKeep.pipe, lengthM: -1 } },
    });
    expect(parsed.ok ? [] : parsed.problems.map(({ path }) => path)).toEqual(['carryAndKeep.pipe.lengthM']);
  });

  it('without half its parts is refused, not filled up', () => {
    const { carryAndKeep: _, ...half } = version1();
    const parsed = parseScenario(half);
    expect(parsed.ok ? [] : parsed.problems.map(({ path }) => path)).toEqual(['carryAndKeep']);
    expect(parseScenario({ format: 'noonwell-scenario', formatVersion: 1 }).ok).toBe(false);
  });

  it('with fields of version 2 written into it keeps them', () => {
    const place = { horizon: [{ azimuthDeg: 90, elevationDeg: 12 }] };
    const parsed = parseScenario({ ...version1(), place });
    expect(parsed.ok && parsed.scenario.place).toEqual(place);
  });
});

it('leaves everything else to the schema', () => {
  for (const value of [null, 1, 'text', [], {}, { formatVersion: 1 }, newScenario()]) {
    expect(upgradeScenario(value)).toBe(value);
  }
  const next = { ...newScenario(), formatVersion: SCENARIO_FORMAT_VERSION + 1 };
  const parsed = parseScenario(next);
  expect(parsed.ok ? [] : parsed.problems.map(({ path }) => path)).toEqual(['formatVersion']);
});
