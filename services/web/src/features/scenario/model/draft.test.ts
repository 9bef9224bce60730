import { RECEIVER_KINDS, newScenario, parseScenario, scenarioFields } from '@noonwell/schema';
import { describe, expect, it } from 'vitest';
import { draftText, fromDraft, isShown, parseNumber, pastedNumbers, toDraft, variantDraft } from './draft.js';

describe('a scenario as typed text', () => {
  it.each(RECEIVER_KINDS)('comes back unchanged from an untouched form (%s)', (kind) => {
    expect(fromDraft(toDraft(newScenario(kind)))).toEqual(newScenario(kind));
  });

  it('keeps a horizon profile and outages, numbers as numbers and days as text', () => {
    const scenario = newScenario('coil');
    scenario.place.horizon = [
      { azimuthDeg: 90, elevationDeg: 12.5 },
      { azimuthDeg: 270, elevationDeg: 3 },
    ];
    scenario.catch.outages = [{ from: '03-01', to: '03-14' }];
    expect(fromDraft(toDraft(scenario))).toEqual(scenario);
  });

  it('leaves text that is no number to the schema, which names field and unit', () => {
    const draft = toDraft(newScenario('coil'));
    const parsed = parseScenario(fromDraft(withText(draft, 'five')));
    expect(parsed.ok ? [] : parsed.problems).toEqual([
      { path: 'catch.dish.apertureDiameterM', message: 'Aperture diameter must be a number in m' },
    ]);
  });

  it('does not take an empty field for zero', () => {
    const parsed = parseScenario(fromDraft(withText(toDraft(newScenario('coil')), '  ')));
    expect(parsed.ok).toBe(false);
  });

  it('switches a choice to a variant that the schema takes', () => {
    const draft = toDraft(newScenario('coil'));
    const branch = draft.catch;
    if (typeof branch !== 'object' || Array.isArray(branch)) throw new TypeError('catch is an object');
    const switched = { ...draft, catch: { ...branch, receiver: variantDraft('catch.receiver', 'cell') } };
    expect(parseScenario(fromDraft(switched)).ok).toBe(true);
    expect(draftText(switched, 'catch.receiver.secondary.kind')).toBe('mixingDuct');
  });

  it('shows the fields of the chosen variant only', () => {
    const draft = toDraft(newScenario('coil'));
    const shown = scenarioFields()
      .filter((field) => isShown(field, (path) => draftText(draft, path)))
      .map(({ path }) => path);
    expect(shown).toContain('catch.receiver.coilUaWK');
    expect(shown).not.toContain('catch.receiver.packingFraction');
    expect(shown).not.toContain('catch.receiver.secondary.kind');
  });
});

describe('numbers as people type them', () => {
  it.each([
    ['0.6', 0.6],
    [' 12 000 ', 12_000],
    ['\u22125', -5],
    ['4e-5', 4e-5],
    ['.5', 0.5],
    ['5.', 5],
  ])('%s', (text, value) => {
    expect(parseNumber(text)).toBe(value);
  });

  it.each(['', 'NaN', 'Infinity', '0x10', '1,5', '5 m', '--1'])('%s is not a number', (text) => {
    expect(parseNumber(text)).toBe(text);
  });

  it('takes a row or a column of cells', () => {
    expect(pastedNumbers('1\t2\t3\n')).toEqual(['1', '2', '3']);
    expect(pastedNumbers('1\r\n2\r\n3')).toEqual(['1', '2', '3']);
    expect(pastedNumbers('1; 2, 3')).toEqual(['1', '2', '3']);
  });
});

function withText(draft: ReturnType<typeof toDraft>, apertureDiameterM: string) {
  const branch = draft.catch;
  if (typeof branch !== 'object' || Array.isArray(branch)) throw new TypeError('catch is an object');
  const dish = branch.dish;
  if (typeof dish !== 'object' || Array.isArray(dish)) throw new TypeError('dish is an object');
  return { ...draft, catch: { ...branch, dish: { ...dish, apertureDiameterM } } };
}
