import { requireRange } from '../errors.js';

const DAYS_A_YEAR = 365;
const SECONDS_A_DAY = 86_400;
const RAD_PER_S = (2 * Math.PI) / (DAYS_A_YEAR * SECONDS_A_DAY);

/** The yearly wave of a ground surface's temperature. */
export interface SurfaceWave {
  /** Mean over the year [°C]. */
  readonly meanC: number;
  /** Half the way from the coldest to the warmest day [K, ≥ 0]. */
  readonly amplitudeK: number;
  /** Day of the year, from 1 at the beginning of 1 January, on which it is coldest. */
  readonly coldestDay: number;
}

/**
 * Temperature of undisturbed ground under a surface whose temperature goes up and down once a year.
 *
 * T(z, t) = mean − amplitude · exp(−z √(π/(365 α))) · cos(2π/365 · (t − coldest − z/2 · √(365/(π α)))), with
 * α in m²/day: the deeper, the smaller the wave and the later it comes.
 *
 * @param wave of the surface **[mean −60…45 °C, amplitude 0…40 K, coldest day 0…367]**
 * @param depthM under the surface **[0…100 m]**
 * @param diffusivityM2S thermal diffusivity of the ground **[1e-8…1e-5 m²/s]**
 * @param day of the year, with its fraction **[0…367]**
 * @returns **[°C]**
 * @throws DomainError outside those ranges
 *
 * Source: Kusuda & Achenbach 1965, Earth Temperature and Thermal Diffusivity at Selected Stations in the United
 * States, ASHRAE Transactions 71 (formula from memory; it solves the conduction equation of a half-space,
 * Carslaw & Jaeger 1959, §2.6, which the tests confirm).
 *
 * @example
 * groundTemperatureC({meanC: 15, amplitudeK: 10, coldestDay: 20}, 1, 6e-7, 20) // 8.89
 */
export function groundTemperatureC(
  wave: SurfaceWave,
  depthM: number,
  diffusivityM2S: number,
  day: number,
): number {
  requireRange('mean of the ground surface [°C]', wave.meanC, -60, 45);
  requireRange('amplitude of the ground surface [K]', wave.amplitudeK, 0, 40);
  requireRange('coldest day of the ground surface', wave.coldestDay, 0, 367);
  requireRange('depth [m]', depthM, 0, 100);
  requireRange('diffusivity of the ground [m²/s]', diffusivityM2S, 1e-8, 1e-5);
  requireRange('day of the year', day, 0, 367);
  // √(π/(365 α)) with α a day is √(ω/2α), and the lag z/2 √(365/(π α)) is that angle over ω.
  const angle = depthM * Math.sqrt(RAD_PER_S / (2 * diffusivityM2S));
  const season = RAD_PER_S * SECONDS_A_DAY * (day - wave.coldestDay);
  return wave.meanC - wave.amplitudeK * Math.exp(-angle) * Math.cos(season - angle);
}
