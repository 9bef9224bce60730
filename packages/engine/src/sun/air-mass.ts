import { STANDARD_PRESSURE_PA } from '../constants.js';
import { requireRange } from '../errors.js';

/**
 * Relative optical air mass at sea level: how much air the beam crosses against the zenith.
 *
 * @param elevationRad - apparent elevation of the sun [rad, 0 to π/2]
 * @returns air mass [1 to 37.92]
 * @throws DomainError below the horizon
 *
 * Source: Kasten & Young 1989, Applied Optics 28:4735, eq. 3.
 *
 * @example
 * kastenYoungAirMass(radians(30)) // 1.994
 */
export function kastenYoungAirMass(elevationRad: number): number {
  requireRange('sun elevation [rad]', elevationRad, 0, Math.PI / 2);
  const elevationDeg = (elevationRad * 180) / Math.PI;
  return 1 / (Math.sin(elevationRad) + 0.50572 * (elevationDeg + 6.07995) ** -1.6364);
}

/**
 * Air mass at the site: the relative air mass times the share of the atmosphere that lies above it.
 *
 * @param elevationRad - apparent elevation of the sun [rad, 0 to π/2]
 * @param pressurePa - air pressure at the site [Pa, 0 to 120 000]
 * @returns pressure-corrected air mass
 * @throws DomainError below the horizon or for an impossible pressure
 *
 * Source: Kasten & Young 1989, with the usual p/101 325 Pa.
 *
 * @example
 * absoluteAirMass(radians(90), 50662.5) // 0.49986
 */
export function absoluteAirMass(elevationRad: number, pressurePa: number): number {
  requireRange('air pressure [Pa]', pressurePa, 0, 120_000);
  return (kastenYoungAirMass(elevationRad) * pressurePa) / STANDARD_PRESSURE_PA;
}
