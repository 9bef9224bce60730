import { SOLAR_CONSTANT_WM2 } from '../constants.js';
import { requireRange } from '../errors.js';

/**
 * Irradiance normal to the sun outside the atmosphere on a day of the year.
 *
 * @param dayOfYear - 1 on 1 January [1 to 366]
 * @returns irradiance [W/m²], 1316 to 1406
 * @throws DomainError outside the year
 *
 * Source: solar constant of Kopp & Lean 2011; distance factor 1 + 0.033 cos(2πn/365), Duffie & Beckman,
 * Solar Engineering of Thermal Processes, eq. 1.4.1a (number of the equation from memory).
 *
 * @example
 * extraterrestrialNormalWm2(3) // 1405.85
 */
export function extraterrestrialNormalWm2(dayOfYear: number): number {
  requireRange('day of the year', dayOfYear, 1, 366);
  return SOLAR_CONSTANT_WM2 * (1 + 0.033 * Math.cos((2 * Math.PI * dayOfYear) / 365));
}
