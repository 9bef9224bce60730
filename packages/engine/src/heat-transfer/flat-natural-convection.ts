import { GRAVITY } from '../constants.js';
import { airFilm, createAirFilm, type AirFilm } from './air.js';

/**
 * Nusselt number of natural convection on a vertical plate.
 * @param rayleigh on the plate's height **[–, 0…1e12]**
 * @param prandtl **[–, > 0]**
 * @returns **[–]** on the plate's height
 *
 * Source: Churchill & Chu 1975, Int. J. Heat Mass Transfer 18:1323, the relation for laminar and turbulent flow.
 * @example
 * verticalPlateNusselt(1e9, 0.7) // 122.6
 */
export function verticalPlateNusselt(rayleigh: number, prandtl: number): number {
  // Roots instead of powers where they are faster: Ra^(1/6) and (0.492/Pr)^(9/16).
  const sixteenth = Math.sqrt(Math.sqrt(Math.sqrt(Math.sqrt(0.492 / prandtl))));
  const root = 0.825 + (0.387 * Math.cbrt(Math.sqrt(rayleigh))) / (1 + sixteenth ** 9) ** (8 / 27);
  return root * root;
}

/**
 * Nusselt number of natural convection under a hot plate that faces down.
 * @param rayleigh on area over perimeter **[–, 1e5…1e10]**; below, the layer is so weak that it counts for nothing
 * @returns **[–]** on area over perimeter
 *
 * Source: McAdams 1954, Heat Transmission, with the length of Goldstein, Sparrow & Jones 1973 (value from memory).
 * @example
 * downwardPlateNusselt(1e8) // 27
 */
export function downwardPlateNusselt(rayleigh: number): number {
  return 0.27 * Math.sqrt(Math.sqrt(rayleigh));
}

/**
 * Natural convection of a flat square face that stands upright, leans forward or faces down.
 *
 * Two relations at once: the vertical plate with gravity along it (g cos tilt), and the plate facing down with
 * gravity across it (g sin tilt). The larger holds, because the flow that carries more heat is the one that
 * develops, and the vertical relation alone would end at pure conduction for a face straight down.
 * Source of taking the larger: Raithby & Hollands, in Handbook of Heat Transfer, 3rd ed. 1998, ch. 4 (value from
 * memory). A face colder than the air is treated by the size of the difference: only a clear night makes it so,
 * by a few kelvin.
 *
 * @param faceC temperature of the face **[°C]**
 * @param airC temperature of the air **[°C]**
 * @param tiltDownRad **[rad, 0 (upright)…π/2 (straight down)]**
 * @param sideM side of the square **[m, > 0]**
 * @param pressurePa of the air **[Pa, > 0]**
 * @returns heat transfer coefficient **[W/(m²·K), > 0]**
 * @example
 * flatNaturalConvectionWm2K(200, 20, 0, 0.3, 101325) // 7.4
 */
export function flatNaturalConvectionWm2K(
  faceC: number,
  airC: number,
  tiltDownRad: number,
  sideM: number,
  pressurePa: number,
): number {
  airFilm(faceC, airC, pressurePa, film);
  return naturalConvectionOfFilm(film, Math.abs(faceC - airC), tiltDownRad, sideM);
}

/** Scratch of the function above, so that a step allocates nothing. */
const film = createAirFilm();

/**
 * {@link flatNaturalConvectionWm2K} for a film already computed.
 * @param air properties at the film temperature
 * @param differenceK size of the difference between face and air **[K, ≥ 0]**
 * @param tiltDownRad **[rad, 0…π/2]**
 * @param sideM **[m, > 0]**
 * @returns **[W/(m²·K), > 0]**
 */
export function naturalConvectionOfFilm(
  air: AirFilm,
  differenceK: number,
  tiltDownRad: number,
  sideM: number,
): number {
  const kinematic = air.kinematicViscosityM2S;
  // Rayleigh number of a length of 1 m; an ideal gas expands by 1/T.
  const perM3 = (GRAVITY * differenceK * air.prandtl) / (air.temperatureK * kinematic * kinematic);
  const along = perM3 * Math.max(0, Math.cos(tiltDownRad)) * sideM * sideM * sideM;
  const lengthM = sideM / 4;
  const across = perM3 * Math.max(0, Math.sin(tiltDownRad)) * lengthM * lengthM * lengthM;
  const upright = (verticalPlateNusselt(along, air.prandtl) * air.conductivityWmK) / sideM;
  const down = (downwardPlateNusselt(across) * air.conductivityWmK) / lengthM;
  return Math.max(upright, down);
}
