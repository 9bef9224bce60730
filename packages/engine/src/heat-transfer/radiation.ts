import { STEFAN_BOLTZMANN, ZERO_CELSIUS_K } from '../constants.js';

/**
 * Net radiation of a surface to large surroundings: εσ(T⁴ − T_surroundings⁴).
 * @param emittance **[–, 0…1]**
 * @param surfaceC temperature of the surface **[°C, ≥ −273.15]**
 * @param surroundingsC temperature of what it sees **[°C, ≥ −273.15]**
 * @returns **[W/m²]**, above 0 when the surface loses
 *
 * Source: Stefan–Boltzmann law for a grey surface small against its surroundings.
 * @example
 * netRadiationWm2(0.9, 600, 20) // 29286
 */
export function netRadiationWm2(emittance: number, surfaceC: number, surroundingsC: number): number {
  const surface = (surfaceC + ZERO_CELSIUS_K) ** 2;
  const surroundings = (surroundingsC + ZERO_CELSIUS_K) ** 2;
  return emittance * STEFAN_BOLTZMANN * (surface * surface - surroundings * surroundings);
}
