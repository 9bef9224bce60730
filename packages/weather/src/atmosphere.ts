import { DomainError, GRAVITY, STANDARD_PRESSURE_PA } from '@noonwell/engine';

const SEA_LEVEL_TEMPERATURE_K = 288.15;
const LAPSE_K_PER_M = 0.0065;
const GAS_CONSTANT_JKGK = 287.05287;
const EXPONENT = GRAVITY / (GAS_CONSTANT_JKGK * LAPSE_K_PER_M);

/**
 * Pressure of the standard atmosphere at an altitude.
 *
 * @param altitudeM geopotential altitude [m, -2000 … 11000]; the difference from the geometric one is under 0.15 % there
 * @returns pressure [Pa]
 * @throws DomainError outside the range
 * Source: ISO 2533:1975, layer with a lapse rate of 6.5 K/km.
 */
export function standardPressurePa(altitudeM: number): number {
  if (!(altitudeM >= -2000 && altitudeM <= 11000))
    throw new DomainError('altitude', altitudeM, '-2000 to 11000 m');
  return STANDARD_PRESSURE_PA * Math.pow(1 - (LAPSE_K_PER_M * altitudeM) / SEA_LEVEL_TEMPERATURE_K, EXPONENT);
}

/**
 * Altitude at which the standard atmosphere has a pressure: the inverse of `standardPressurePa`.
 *
 * @param pressurePa [Pa, 22700 … 127700]
 * @returns geopotential altitude [m]
 * @throws DomainError outside the range
 * Source: ISO 2533:1975.
 */
export function standardAltitudeM(pressurePa: number): number {
  if (!(pressurePa >= 22_600 && pressurePa <= 127_800)) {
    throw new DomainError('pressure', pressurePa, '22600 to 127800 Pa');
  }
  return (
    (SEA_LEVEL_TEMPERATURE_K / LAPSE_K_PER_M) *
    (1 - Math.pow(pressurePa / STANDARD_PRESSURE_PA, 1 / EXPONENT))
  );
}
