import type { TableDecimalMark } from '@noonwell/schema';
import { parseNumber } from '../epw/cells.js';

/** Words that mean "no value". */
const MISSING_WORDS = new Set(['', '-', '--', 'na', 'n/a', 'nan', 'null', 'none', 'missing']);
/** Numbers that mean "no value" where they lie outside what the channel can be (common practice, no source). */
const MISSING_NUMBERS = new Set([-9900, -9999, -99999, -9999.9, -999, -999.9, -99, 999, 9999, 99999, 999999]);

export function isMissingWord(cell: string): boolean {
  return MISSING_WORDS.has(cell.trim().toLowerCase());
}

export function isMissingNumber(value: number): boolean {
  return MISSING_NUMBERS.has(value);
}

/** The number of a cell; NaN for anything else. */
export function parseCell(cell: string, decimalMark: TableDecimalMark): number {
  if (decimalMark === 'point') return parseNumber(cell);
  return cell.includes('.') ? NaN : parseNumber(cell.replace(',', '.'));
}
