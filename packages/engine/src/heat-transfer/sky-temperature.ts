import { ZERO_CELSIUS_K } from '../constants.js';

/**
 * Radiating temperature of the clear sky: 0.0552 T^1.5.
 * @param dryBulbC temperature of the air near the ground **[°C, −10…40 where it was measured]**
 * @returns **[K]**; clouds raise it towards the air's temperature, dry or high places lower it by up to 10 K
 *
 * Source: Swinbank 1963, Q. J. R. Meteorol. Soc. 89:339.
 * @example
 * clearSkyTemperatureK(20) // 277.06
 */
export function clearSkyTemperatureK(dryBulbC: number): number {
  const airK = dryBulbC + ZERO_CELSIUS_K;
  return 0.0552 * airK * Math.sqrt(airK);
}
