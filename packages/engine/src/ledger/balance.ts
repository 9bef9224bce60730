import { LEDGER_LINES, LEDGER_PARTS, LEDGER_SIGN, type LedgerDirection, type LedgerPart } from './lines.js';

/** Greatest residual of a part over the beam on the aperture in the same time [1]. */
export const RESIDUAL_LIMIT = 1e-9;

interface PartTerms {
  readonly indices: Int32Array;
  readonly signs: Float64Array;
}

const TERMS: Readonly<Record<LedgerPart, PartTerms>> = Object.fromEntries(
  LEDGER_PARTS.map((part) => {
    const terms = LEDGER_LINES.flatMap((line, index) => {
      const direction = (line.parts as Partial<Record<LedgerPart, LedgerDirection>>)[part];
      return direction === undefined ? [] : [{ index, sign: LEDGER_SIGN[direction] }];
    });
    return [
      part,
      {
        indices: Int32Array.from(terms, (term) => term.index),
        signs: Float64Array.from(terms, (term) => term.sign),
      },
    ];
  }),
) as Record<LedgerPart, PartTerms>;

/**
 * What enters a part minus what leaves it and what it keeps, in the unit of `lines`.
 * @param lines ledger in the order of LEDGER_LINES, any energy unit
 * @param offset where the ledger begins in `lines`
 */
export function partResidual(part: LedgerPart, lines: Float64Array, offset = 0): number {
  const { indices, signs } = TERMS[part];
  let residual = 0;
  for (let term = 0; term < indices.length; term++) {
    residual += (signs[term] ?? 0) * (lines[offset + (indices[term] ?? 0)] ?? NaN);
  }
  return residual;
}

/** The first part that does not balance within `limit` (same unit as `lines`), or null. NaN does not balance. */
export function findImbalance(
  lines: Float64Array,
  limit: number,
  offset = 0,
): { part: LedgerPart; residual: number } | null {
  for (const part of LEDGER_PARTS) {
    const residual = partResidual(part, lines, offset);
    if (!(Math.abs(residual) <= limit)) return { part, residual };
  }
  return null;
}

/** All parts that do not balance within `limit`. */
export function findImbalances(lines: Float64Array, limit: number): { part: LedgerPart; residual: number }[] {
  return LEDGER_PARTS.map((part) => ({ part, residual: partResidual(part, lines) })).filter(
    ({ residual }) => !(Math.abs(residual) <= limit),
  );
}
