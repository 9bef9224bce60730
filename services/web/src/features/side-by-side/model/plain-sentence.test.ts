import { newScenario } from '@noonwell/schema';
import { describe, expect, it } from 'vitest';
import { comparedFixture, type FixtureChanges } from './fixtures.js';
import { plainSentences as plainSentencesAsShown } from './plain-sentence.js';

/** The spaces between number and unit do not break; here they are plain. */
const plainSentences: typeof plainSentencesAsShown = (baseline, other) =>
  plainSentencesAsShown(baseline, other).map(({ tone, text }) => ({
    tone,
    text: text.replaceAll('\u00a0', ' '),
  }));

const coil = comparedFixture({ summary: { heatDeliveredKwh: 10_000, powerAcKwh: 0, loadHeatKwh: 16_000 } });

function cell(summary: FixtureChanges['summary'], more: Omit<FixtureChanges, 'summary'> = {}) {
  return comparedFixture({
    ...more,
    summary: { loadHeatKwh: 16_000, ...summary },
    compared: { name: 'Cells', position: 1, ...more.compared },
  });
}

function told(other: ReturnType<typeof cell>, baseline = coil) {
  return plainSentences(baseline, other).map(({ text }) => text);
}

describe('the plain sentence', () => {
  it('says what is given up before what is gained, on which weather year and loads', () => {
    const [sentence] = plainSentences(coil, cell({ heatDeliveredKwh: 6400, powerAcKwh: 1850 }));
    expect(sentence).toEqual({
      tone: 'worse',
      text: 'Against “Coil”, “Cells” gives up 3,600 kWh of solar heat to the load (36.0 % less), but gains 1,850 kWh of electricity in the year, on the weather year “Invented desert” and with the same loads (16,000 kWh of heat and 12,000 kWh of electricity).',
    });
  });

  it('says so when both are gained', () => {
    const [sentence] = plainSentences(coil, cell({ heatDeliveredKwh: 11_000, powerAcKwh: 500 }));
    expect(sentence?.tone).toBe('better');
    expect(sentence?.text).toContain(
      'gains 500 kWh of electricity and gains 1,000 kWh of solar heat to the load (10.0 % more) in the year',
    );
  });

  it('says so when both are given up', () => {
    const baseline = comparedFixture({ summary: { heatDeliveredKwh: 10_000, powerAcKwh: 2000 } });
    const [sentence] = plainSentences(baseline, cell({ heatDeliveredKwh: 9000, powerAcKwh: 1000 }));
    expect(sentence?.tone).toBe('worse');
    expect(sentence?.text).toContain(
      'gives up 1,000 kWh of electricity (50.0 % less) and gives up 1,000 kWh of solar heat to the load (10.0 % less)',
    );
  });

  it('calls differences within rounding equal', () => {
    const [sentence] = plainSentences(coil, cell({ heatDeliveredKwh: 10_000.4, powerAcKwh: 0.3 }));
    expect(sentence?.tone).toBe('even');
    expect(sentence?.text).toContain(
      'gives as much electricity and as much solar heat to the load in the year',
    );
  });

  it('speaks of heat only where neither makes electricity', () => {
    const [sentence] = plainSentences(coil, cell({ heatDeliveredKwh: 9000, powerAcKwh: 0 }));
    expect(sentence?.text).toMatch(
      /“Cells” gives up 1,000 kWh of solar heat to the load \(10\.0 % less\) in the year/,
    );
    expect(sentence?.text).toMatch(/Neither makes electricity\.$/);
  });

  it('gives no percentage of nothing', () => {
    const [sentence] = plainSentences(coil, cell({ heatDeliveredKwh: 10_000, powerAcKwh: 1850 }));
    expect(sentence?.text).toContain(
      'gains 1,850 kWh of electricity and gives as much solar heat to the load in the year',
    );
  });

  it('says that the other uses more for pump and tracker', () => {
    expect(told(cell({ heatDeliveredKwh: 6400, powerAcKwh: 1850, pumpUseKwh: 36 }))).toContainEqual(
      expect.stringMatching(/^Its pump and tracker use 31\.0 kWh of electricity more in the year/),
    );
  });
});

describe('conditions that differ', () => {
  it.each<[string, FixtureChanges, string]>([
    [
      'weather year',
      {
        compared: {
          weatherYearId: '00000000-0000-4000-8000-0000000000bb',
          weatherYearName: 'Invented coast',
        },
      },
      'the weather year (Invented desert / Invented coast)',
    ],
    ['model version', { summary: { modelVersion: '0.0.9' } }, 'the version of the model'],
    ['step', { summary: { stepMinutes: 60 } }, 'the time step (5 min / 60 min)'],
    ['heat load', { document: withLitres(2000) }, 'the heat load'],
    ['electricity', { document: withElectricity(1) }, 'the electricity use of the site'],
  ])('a different %s is said before any number', (_, changes, words) => {
    const [first, second] = plainSentences(coil, cell({ powerAcKwh: 1850, ...changes.summary }, changes));
    expect(first?.tone).toBe('worse');
    expect(first?.text).toMatch(/^Not like for like: /);
    expect(first?.text).toContain(words);
    expect(second?.text).toMatch(/^Against /);
  });

  it('does not claim one weather year or the same loads where they differ', () => {
    const [, headline] = told(
      cell(
        { powerAcKwh: 1850 },
        {
          document: withLitres(2000),
          compared: {
            weatherYearId: '00000000-0000-4000-8000-0000000000bb',
            weatherYearName: 'Invented coast',
          },
        },
      ),
    );
    expect(headline).toContain(
      'each on its own weather year (Invented desert / Invented coast) and with different loads',
    );
  });

  it('a machine that differs is what is compared, not a condition', () => {
    expect(told(cell({ powerAcKwh: 1850 }, { document: newScenario('cell') }))[0]).toMatch(/^Against /);
  });
});

describe('beam that was turned away', () => {
  it('is said in kWh when the cells had to be spared', () => {
    expect(
      told(cell({ powerAcKwh: 1850 }, { lines: { defocusedReceiverLimit: 41, absorbed: 859 } })),
    ).toContainEqual(
      expect.stringMatching(
        /^“Cells” turned off the sun to keep its receiver below its temperature limit: 41\.0 kWh of beam \(4\.10 % of the year's\)/,
      ),
    );
  });

  it('is said in kWh when the store was full, for the baseline too', () => {
    const full = comparedFixture({ lines: { defocusedStoreFull: 100, absorbed: 800 } });
    expect(told(cell({}), full)).toContainEqual(
      expect.stringMatching(/^“Coil” turned off the sun because its store was full: 100 kWh of beam/),
    );
  });

  it('is left to the ledger while it is small', () => {
    const sentences = told(cell({}, { lines: { defocusedReceiverLimit: 9, defocusedStoreFull: 9 } }));
    expect(sentences.filter((text) => text.includes('turned off the sun'))).toEqual([]);
  });
});

it('says when the load goes without heat', () => {
  expect(told(cell({ unmetHeatKwh: 250 }))).toContainEqual(
    expect.stringMatching(/^With “Cells” the load goes without 250 kWh of heat/),
  );
});

function withLitres(litresPerDay: number) {
  const scenario = newScenario('coil');
  return {
    ...scenario,
    use: { ...scenario.use, loads: scenario.use.loads.map((load) => ({ ...load, litresPerDay })) },
  };
}

function withElectricity(annualUseKwh: number) {
  const scenario = newScenario('coil');
  return {
    ...scenario,
    use: { ...scenario.use, electricity: { ...scenario.use.electricity, annualUseKwh } },
  };
}
