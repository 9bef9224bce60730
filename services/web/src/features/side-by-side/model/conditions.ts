import type { Compared } from './compared.js';

/** Why two runs may not be held against each other as two answers to one question. */
export interface ConditionDifference {
  readonly condition: 'weatherYear' | 'modelVersion' | 'step' | 'heatLoad' | 'electricityUse';
  /** "the weather years (A, B)": fits behind "differ in". */
  readonly words: string;
}

/** What must be the same for a difference to come from the machines alone. */
export function differingConditions(baseline: Compared, other: Compared): ConditionDifference[] {
  const found: ConditionDifference[] = [];
  if (baseline.weatherYearId !== other.weatherYearId) {
    found.push({
      condition: 'weatherYear',
      words: `the weather year (${baseline.weatherYearName} / ${other.weatherYearName})`,
    });
  }
  if (baseline.summary.modelVersion !== other.summary.modelVersion) {
    found.push({
      condition: 'modelVersion',
      words: `the version of the model (${baseline.summary.modelVersion} / ${other.summary.modelVersion})`,
    });
  }
  if (baseline.summary.stepMinutes !== other.summary.stepMinutes) {
    found.push({
      condition: 'step',
      words: `the time step (${baseline.summary.stepMinutes} min / ${other.summary.stepMinutes} min)`,
    });
  }
  if (!sameContent(baseline.document.use.loads, other.document.use.loads)) {
    found.push({ condition: 'heatLoad', words: 'the heat load' });
  }
  if (!sameContent(baseline.document.use.electricity, other.document.use.electricity)) {
    found.push({ condition: 'electricityUse', words: 'the electricity use of the site' });
  }
  return found;
}

/** Documents come parsed by one schema, so their keys stand in one order. */
function sameContent(a: unknown, b: unknown): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}
