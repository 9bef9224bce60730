import type { RunSummary } from '@noonwell/schema';
import { FIGURES, type Figure } from './figures.js';

/** better, worse: by which way is welcome. higher, lower: where neither way is. */
export type Verdict = 'better' | 'worse' | 'higher' | 'lower' | 'equal' | 'unknown';

export interface Difference {
  readonly figure: Figure;
  readonly baseline: number | null;
  readonly other: number | null;
  /** Other minus baseline, in the figure's unit; null where one of the two has no such figure. */
  readonly absolute: number | null;
  /** Difference over the size of the baseline; null where the baseline is nothing, or a temperature, whose zero means nothing. */
  readonly ratio: number | null;
  readonly verdict: Verdict;
}

/** Differences that a reader need not act on: half a kilowatt-hour, a twentieth of a degree or an hour … */
const RESOLUTION: Readonly<Record<string, number>> = { kWh: 0.5, '°C': 0.05, h: 0.05, '1': 5e-5 };
/** … or a ten-thousandth of the figure, well under what the time step leaves open. */
const RELATIVE_RESOLUTION = 1e-4;

/** Whether two figures of one unit are the same as far as a run can tell. */
export function equalWithinRounding(a: number, b: number, unit: string): boolean {
  const allowed = Math.max(RESOLUTION[unit] ?? 0, RELATIVE_RESOLUTION * Math.max(Math.abs(a), Math.abs(b)));
  return Math.abs(a - b) <= allowed;
}

/** The yearly totals of one scenario against the baseline's. */
export function differences(baseline: RunSummary, other: RunSummary): Difference[] {
  return FIGURES.map((figure) => difference(figure, baseline[figure.key], other[figure.key]));
}

function difference(figure: Figure, baseline: number | null, other: number | null): Difference {
  if (baseline === null || other === null) {
    return { figure, baseline, other, absolute: null, ratio: null, verdict: 'unknown' };
  }
  const absolute = other - baseline;
  return {
    figure,
    baseline,
    other,
    absolute,
    ratio: baseline === 0 || figure.unit === '°C' ? null : absolute / Math.abs(baseline),
    verdict: verdict(figure, baseline, other),
  };
}

function verdict(figure: Figure, baseline: number, other: number): Verdict {
  if (equalWithinRounding(baseline, other, figure.unit)) return 'equal';
  const rises = other > baseline;
  if (figure.welcome === 'neither') return rises ? 'higher' : 'lower';
  return rises === (figure.welcome === 'more') ? 'better' : 'worse';
}
