import { requireRange } from '../errors.js';

/** Nearer to balanced flow than this the general formula loses its digits and the limit is exact to 1e-9. */
const BALANCED = 1e-9;

/**
 * Effectiveness of a counter-flow heat exchanger: heat moved over the most that could be moved.
 * @param ntu conductance over the smaller capacity flow, UA/C_min **[–, ≥ 0]**
 * @param capacityRatio C_min/C_max **[–, 0 (one side boils or stays constant)…1 (balanced)]**
 * @returns **[–, 0…1]**
 * @throws DomainError for a ratio outside 0–1 or a negative NTU
 *
 * Source: Kays & London, Compact Heat Exchangers; ε = (1 − e^(−N(1−r)))/(1 − r e^(−N(1−r))), N/(1 + N) for r = 1.
 * @example
 * counterFlowEffectiveness(2, 0.5) // 0.7746
 */
export function counterFlowEffectiveness(ntu: number, capacityRatio: number): number {
  requireRange('NTU', ntu, 0, Number.MAX_VALUE);
  requireRange('capacity ratio', capacityRatio, 0, 1);
  const unbalance = 1 - capacityRatio;
  if (unbalance < BALANCED) return ntu / (1 + ntu);
  // 1 − r e^(−x) = (1 − r) + r (1 − e^(−x)), which keeps its digits where both sides are nearly balanced.
  const moved = -Math.expm1(-ntu * unbalance);
  return moved / (unbalance + capacityRatio * moved);
}
