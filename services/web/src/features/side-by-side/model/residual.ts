import { NO_VALUE } from '../../../shared/format/number.js';

/** Numbers that are nearly nothing, as powers of ten: "3.1e−12". */
export function formatResidual(value: number | null | undefined): string {
  if (value == null || !Number.isFinite(value)) return NO_VALUE;
  return value === 0 ? '0' : value.toExponential(1).replaceAll('-', '\u2212');
}
