import { DomainError, requireRange } from '../errors.js';

/**
 * Spreads the beam of one weather record over its sub-steps, so that the record's energy is kept.
 *
 * A record's DNI is the mean over the whole interval. Where the sun rises or sets inside it, that energy came
 * in the sunlit part only: each sunlit sub-step gets mean × n / (sunlit sub-steps) and the others nothing. A
 * record with beam but no sunlit sub-step (a clock that is off, a mountain sunrise) is spread evenly, so that
 * its energy still enters the ledger.
 *
 * @param recordDniWm2 - mean beam normal irradiance of the record [W/m², ≥ 0]
 * @param sunlit - one entry a sub-step of equal length: 1 where the sun stands above the horizon at the
 *   sub-step's midpoint, else 0
 * @param out - receives the DNI of each sub-step [W/m²]; as long as `sunlit`. Mean(out) equals the record's
 *   DNI within round-off (n × 2⁻⁵³ relative)
 * @throws DomainError for a negative or missing DNI, no sub-steps, or arrays of different length
 *
 * Source: conservation of energy over the record.
 */
export function spreadBeam(recordDniWm2: number, sunlit: Uint8Array, out: Float64Array): void {
  requireRange('beam normal irradiance [W/m²]', recordDniWm2, 0, Number.MAX_VALUE);
  const subSteps = sunlit.length;
  if (subSteps === 0 || out.length !== subSteps) {
    throw new DomainError(
      'length of the sub-step arrays',
      `${subSteps} and ${out.length}`,
      'equal and at least 1',
    );
  }
  let lit = 0;
  for (let i = 0; i < subSteps; i++) if (sunlit[i] !== 0) lit++;
  if (lit === 0 || lit === subSteps) {
    out.fill(recordDniWm2);
    return;
  }
  const litDniWm2 = (recordDniWm2 * subSteps) / lit;
  for (let i = 0; i < subSteps; i++) out[i] = sunlit[i] !== 0 ? litDniWm2 : 0;
}
