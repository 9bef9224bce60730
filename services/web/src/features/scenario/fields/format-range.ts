import type { ScenarioField } from '@noonwell/schema';
import { LOCALE } from '../../../shared/format/locale.js';

/** "0.5 to 30 m"; null for a choice. */
export function formatRange({ min, max, unit }: Pick<ScenarioField, 'min' | 'max' | 'unit'>): string | null {
  if (min === undefined || max === undefined) return null;
  const range = `${exact(min)} to ${exact(max)}`;
  return unit === '' || unit === '1' ? range : `${range} ${unit}`;
}

function exact(value: number): string {
  // Limits are typed as they stand, so they are not rounded; very small ones as powers of ten.
  if (value !== 0 && Math.abs(value) < 1e-3) return value.toExponential().replace('-', '\u2212');
  return value.toLocaleString(LOCALE, { maximumFractionDigits: 6 }).replace('-', '\u2212');
}
