import { requireRange } from '../errors.js';
import { airFilm, createAirFilm } from './air.js';
import { naturalConvectionOfFilm } from './flat-natural-convection.js';
import { windConvectionOfFilm } from './flat-wind-convection.js';

/** Room for round-off in a tilt computed from the sun's position [rad]. */
const TILT_SLACK_RAD = 1e-6;

/**
 * Convection from a receiver's flat square face to still or moving air.
 *
 * Natural convection and wind combined by cubes, (h_natural³ + h_wind³)^(1/3): the stronger rules and there is
 * no jump where they change places. Finite and positive for any temperature, so that a solver may overstep.
 *
 * @param faceC temperature of the face **[°C, −100…1500; extrapolated beyond]**
 * @param airC temperature of the air **[°C, −60…60]**
 * @param windMs speed at the receiver **[m/s, ≥ 0]**
 * @param tiltDownRad **[rad, 0 (upright)…π/2 (straight down)]**: a dish's face looks down by the sun's elevation
 * @param sideM side of the square **[m, > 0]**
 * @param pressurePa of the air **[Pa, > 0]**
 * @returns heat transfer coefficient **[W/(m²·K), > 0]**
 * @throws DomainError for a tilt outside its range (a face looking up loses by other relations)
 *
 * Source: Churchill 1977, AIChE J. 23:10, for the exponent 3 of mixed convection; the parts in
 * flatNaturalConvectionWm2K and flatWindConvectionWm2K.
 * @example
 * flatFaceConvectionWm2K(200, 20, 5, 0, 0.3, 101325) // 20.8
 */
export function flatFaceConvectionWm2K(
  faceC: number,
  airC: number,
  windMs: number,
  tiltDownRad: number,
  sideM: number,
  pressurePa: number,
): number {
  requireRange(
    'tilt of the face below upright [rad]',
    tiltDownRad,
    -TILT_SLACK_RAD,
    Math.PI / 2 + TILT_SLACK_RAD,
  );
  airFilm(faceC, airC, pressurePa, film);
  const natural = naturalConvectionOfFilm(film, Math.abs(faceC - airC), tiltDownRad, sideM);
  const wind = windConvectionOfFilm(film, windMs, sideM);
  return Math.cbrt(natural * natural * natural + wind * wind * wind);
}

/** Scratch of the function above, so that a step allocates nothing. */
const film = createAirFilm();
