import { newScenario } from '@noonwell/schema';
import { expect, it } from 'vitest';
import { cautions } from './cautions.js';
import { comparedFixture, type FixtureChanges } from './fixtures.js';

function coldWater() {
  const document = newScenario('coil');
  return {
    ...document,
    use: { ...document.use, loads: document.use.loads.map((load) => ({ ...load, setPointC: 40 })) },
  };
}

function keys(changes: FixtureChanges) {
  return cautions([
    comparedFixture({
      document: coldWater(),
      ...changes,
      summary: { tankTopMaxC: 50, outletMaxC: 55, ...changes.summary },
    }),
  ]).map(({ key }) => key);
}

it('always warns of the focus', () => {
  expect(keys({})).toEqual(['focus']);
});

it('warns where the result shows the danger', () => {
  expect(keys({ summary: { faceMaxC: 551 } })).toContain('hotFace');
  expect(keys({ summary: { pipeFreezeHours: 1 } })).toContain('freezing');
  expect(keys({ summary: { outletMaxC: 61 } })).toContain('scald');
  expect(keys({ document: newScenario('coil') })).toContain('scald');
  expect(keys({ summary: { powerDcKwh: 1 } })).toContain('electricity');
});

it('names the scenario and the number', () => {
  const hot = cautions([
    comparedFixture(),
    comparedFixture({ compared: { name: 'Bare face' }, summary: { faceMaxC: 612.4 } }),
  ]);
  const caution = hot.find(({ key }) => key === 'hotFace');
  expect(caution?.title).toContain('612 °C');
  expect(caution?.text).toMatch(/^“Bare face”: /);
});
