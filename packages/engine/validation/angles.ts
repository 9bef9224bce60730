/** Degrees to radians, for cases stated in degrees. */
export const radians = (deg: number): number => (deg * Math.PI) / 180;

/** Radians to degrees. */
export const degrees = (rad: number): number => (rad * 180) / Math.PI;

/** Angle between two directions given as elevation and azimuth [rad]: haversine form, exact for small angles. */
export function angularSeparationRad(
  elevationA: number,
  azimuthA: number,
  elevationB: number,
  azimuthB: number,
): number {
  const halfChordSquare =
    Math.sin((elevationA - elevationB) / 2) ** 2 +
    Math.cos(elevationA) * Math.cos(elevationB) * Math.sin((azimuthA - azimuthB) / 2) ** 2;
  return 2 * Math.asin(Math.sqrt(halfChordSquare));
}
