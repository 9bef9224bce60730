import { LOCALE } from './locale.js';

/** Stands where a figure does not exist (no cells, no run yet). */
export const NO_VALUE = '–';
/** Between a number and its unit: they never part at a line end. */
const UNIT_SPACE = '\u00a0';

const significantFormats = new Map<number, Intl.NumberFormat>();
const fixedFormats = new Map<number, Intl.NumberFormat>();

/**
 * A number to so many significant figures (three unless asked), grouped by thousands: 12,300 · 0.0412 · −3.20.
 * Trailing zeros are kept, because they say how exact the figure is.
 */
export function formatSignificant(value: number | null | undefined, digits = 3): string {
  if (value == null || !Number.isFinite(value)) return NO_VALUE;
  if (value === 0) return '0';
  let format = significantFormats.get(digits);
  if (format === undefined) {
    format = new Intl.NumberFormat(LOCALE, {
      minimumSignificantDigits: digits,
      maximumSignificantDigits: digits,
    });
    significantFormats.set(digits, format);
  }
  return withMinus(format.format(value));
}

/** A number with so many decimals, for columns that are compared digit by digit. */
export function formatFixed(value: number | null | undefined, decimals = 0): string {
  if (value == null || !Number.isFinite(value)) return NO_VALUE;
  let format = fixedFormats.get(decimals);
  if (format === undefined) {
    format = new Intl.NumberFormat(LOCALE, {
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    });
    fixedFormats.set(decimals, format);
  }
  const text = format.format(value);
  return withMinus(/[1-9]/.test(text) ? text : text.replace('-', ''));
}

/** A number and its unit that stay together; the unit "1" of a pure number is not printed. */
export function formatQuantity(value: number | null | undefined, unit: string, digits = 3): string {
  const text = formatSignificant(value, digits);
  if (text === NO_VALUE || unit === '1' || unit === '') return text;
  return unit === '°' ? `${text}${unit}` : `${text}${UNIT_SPACE}${unit}`;
}

/** A share as per cent: 0.0834 → 8.34 %. */
export function formatShare(share: number | null | undefined, digits = 3): string {
  if (share == null) return NO_VALUE;
  return formatQuantity(share * 100, '%', digits);
}

/** A whole number of things. */
export function formatCount(count: number): string {
  return formatFixed(count, 0);
}

/** A difference with its sign, + included. */
export function formatSigned(value: number | null | undefined, digits = 3): string {
  const text = formatSignificant(value, digits);
  return value != null && value > 0 && text !== NO_VALUE ? `+${text}` : text;
}

/** "1 run", "3 runs". */
export function formatPlural(count: number, one: string, many: string): string {
  return `${formatCount(count)} ${count === 1 ? one : many}`;
}

function withMinus(text: string): string {
  return text.replace('-', '\u2212');
}
