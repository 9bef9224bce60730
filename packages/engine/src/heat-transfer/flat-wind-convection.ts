import { airFilm, createAirFilm, type AirFilm } from './air.js';

/**
 * Wind on a flat square face, whatever its direction.
 *
 * Nu = 0.86 Re^0.5 Pr^(1/3) on the length 4 × area / perimeter, which for a square is its side. Measured for
 * Reynolds numbers of 20 000 to 90 000 (a 0.3 m face in 1–5 m/s) at all angles of attack and yaw, within about
 * 10 %; used beyond, where nothing better is published for so short a plate.
 *
 * @param faceC temperature of the face **[°C]**
 * @param airC temperature of the air **[°C]**
 * @param windMs speed at the face **[m/s, ≥ 0]**
 * @param sideM side of the square **[m, > 0]**
 * @param pressurePa of the air **[Pa, > 0]**
 * @returns heat transfer coefficient **[W/(m²·K), ≥ 0]**
 *
 * Source: Sparrow, Ramsey & Mass 1979, J. Heat Transfer 101:199.
 * @example
 * flatWindConvectionWm2K(200, 20, 5, 0.3, 101325) // 20.5
 */
export function flatWindConvectionWm2K(
  faceC: number,
  airC: number,
  windMs: number,
  sideM: number,
  pressurePa: number,
): number {
  airFilm(faceC, airC, pressurePa, film);
  return windConvectionOfFilm(film, windMs, sideM);
}

/** Scratch of the function above, so that a step allocates nothing. */
const film = createAirFilm();

/**
 * {@link flatWindConvectionWm2K} for a film already computed.
 * @param air properties at the film temperature
 * @param windMs **[m/s, ≥ 0]**
 * @param sideM **[m, > 0]**
 * @returns **[W/(m²·K), ≥ 0]**
 */
export function windConvectionOfFilm(air: AirFilm, windMs: number, sideM: number): number {
  const reynolds = (windMs * sideM) / air.kinematicViscosityM2S;
  return (0.86 * Math.sqrt(reynolds) * Math.cbrt(air.prandtl) * air.conductivityWmK) / sideM;
}
