import { LEDGER_LINES, LEDGER_PARTS, LEDGER_SIGN, type LedgerDirection, type LedgerPart } from './lines.js';

/** Greatest residual of a part over the beam on the aperture in the same time [1]. */
export const RESIDUAL_LIMIT = 1e-9;

/**
 * Round-off of sums over many inner steps, over the energies that pass a part [1]. It only counts where a part
 * moves a thousand times more energy than the dish catches (a plant's whole hot water beside a small dish).
 */
export const ROUND_OFF = 1e-12;

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
 */
export function partResidual(part: LedgerPart, lines: Float64Array): number {
  const { indices, signs } = TERMS[part];
  let residual = 0;
  for (let term = 0; term < indices.length; term++) {
    residual += (signs[term] ?? 0) * (lines[indices[term] ?? 0] ?? NaN);
  }
  return residual;
}

/** Energies that pass a part, each line by its size: what round-off is measured by. */
function throughput(part: LedgerPart, lines: Float64Array): number {
  const { indices } = TERMS[part];
  let sum = 0;
  for (let term = 0; term < indices.length; term++) sum += Math.abs(lines[indices[term]!]!);
  return sum;
}

/** Whether a part balances within `limit` and the round-off of its own lines. NaN does not balance. */
function balances(part: LedgerPart, lines: Float64Array, limit: number): boolean {
  return Math.abs(partResidual(part, lines)) <= limit + ROUND_OFF * throughput(part, lines);
}

/** The first part that does not balance within `limit` (same unit as `lines`), or null. */
export function findImbalance(
  lines: Float64Array,
  limit: number,
): { part: LedgerPart; residual: number } | null {
  for (const part of LEDGER_PARTS) {
    if (!balances(part, lines, limit)) return { part, residual: partResidual(part, lines) };
  }
  return null;
}

/** All parts that do not balance within `limit`. */
export function findImbalances(lines: Float64Array, limit: number): { part: LedgerPart; residual: number }[] {
  return LEDGER_PARTS.filter((part) => !balances(part, lines, limit)).map((part) => ({
    part,
    residual: partResidual(part, lines),
  }));
}
