import { requireRange } from '../errors.js';

/**
 * Share of the beam on the gross aperture that a stated power would need.
 *
 * @param statedPowerW - power the rating states [W, ≥ 0]
 * @param dniWm2 - beam normal irradiance the rating is stated at [W/m², > 0]
 * @param grossApertureM2 - gross aperture of the dish [m², > 0]
 * @returns share; above 1 the rating asks for more than enters
 * @throws DomainError outside those ranges
 *
 * Source: arithmetic, P/(DNI·A).
 *
 * @example
 * beamShareNeeded(6000, 1000, 19.635) // 0.3056
 */
export function beamShareNeeded(statedPowerW: number, dniWm2: number, grossApertureM2: number): number {
  requireRange('stated power [W]', statedPowerW, 0, Number.MAX_VALUE);
  requireRange('beam normal irradiance [W/m²]', dniWm2, Number.MIN_VALUE, Number.MAX_VALUE);
  requireRange('gross aperture [m²]', grossApertureM2, Number.MIN_VALUE, Number.MAX_VALUE);
  return statedPowerW / (dniWm2 * grossApertureM2);
}
