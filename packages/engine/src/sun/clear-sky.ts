import { requireRange } from '../errors.js';
import { kastenYoungAirMass } from './air-mass.js';

/**
 * Beam irradiance of a clear sky, for overlays and plausibility only (never fed to a run).
 *
 * The air mass is the relative one, not corrected for pressure: the altitude term does that.
 *
 * @param elevationRad - apparent elevation of the sun [rad, −π/2 to π/2]
 * @param altitudeM - altitude of the site [m, −500 to 7000: the term is linear in altitude]
 * @returns beam normal irradiance [W/m²]; 0 when the sun is not above the horizon
 * @throws DomainError outside those ranges
 *
 * Source: Meinel & Meinel 1976, Applied Solar Energy, with the altitude term of Laue 1970, Solar Energy
 * 13:43. Coefficients: value from memory.
 *
 * @example
 * meinelClearSkyBeamWm2(radians(30), 0) // 765.5
 */
export function meinelClearSkyBeamWm2(elevationRad: number, altitudeM: number): number {
  requireRange('sun elevation [rad]', elevationRad, -Math.PI / 2, Math.PI / 2);
  requireRange('altitude [m]', altitudeM, -500, 7000);
  if (elevationRad <= 0) return 0;
  const altitudeTerm = 0.14 * (altitudeM / 1000);
  const transmittance = 0.7 ** (kastenYoungAirMass(elevationRad) ** 0.678);
  return 1353 * ((1 - altitudeTerm) * transmittance + altitudeTerm);
}
