import { requireRange } from '../errors.js';

/**
 * Cosine of the angle between the sun's rays and the normal of a tilted plane.
 *
 * @param sunElevationRad - elevation of the sun [rad, −π/2 to π/2]
 * @param sunAzimuthRad - clockwise from north [rad]
 * @param tiltRad - tilt of the plane, 0 = horizontal and facing up [rad, 0 to π]
 * @param planeAzimuthRad - azimuth the plane faces, clockwise from north [rad]
 * @returns cosine of incidence [−1 to 1]; negative when the sun is behind the plane (not clipped, so the
 *   caller decides)
 * @throws DomainError for an impossible elevation or tilt, or an azimuth that is not a number
 *
 * Source: Duffie & Beckman, Solar Engineering of Thermal Processes, eq. 1.6.3 (number from memory), written
 * in elevation and azimuth: the scalar product of two unit vectors.
 *
 * @example
 * cosIncidence(radians(90), 0, radians(60), 0) // 0.5
 */
export function cosIncidence(
  sunElevationRad: number,
  sunAzimuthRad: number,
  tiltRad: number,
  planeAzimuthRad: number,
): number {
  requireRange('sun elevation [rad]', sunElevationRad, -Math.PI / 2, Math.PI / 2);
  requireRange('tilt [rad]', tiltRad, 0, Math.PI);
  const azimuthDifferenceRad = sunAzimuthRad - planeAzimuthRad;
  requireRange('azimuth difference [rad]', azimuthDifferenceRad, -4 * Math.PI, 4 * Math.PI);
  const cosine =
    Math.sin(sunElevationRad) * Math.cos(tiltRad) +
    Math.cos(sunElevationRad) * Math.sin(tiltRad) * Math.cos(azimuthDifferenceRad);
  return Math.max(-1, Math.min(1, cosine));
}
