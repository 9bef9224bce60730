import { DomainError, requireRange } from '../errors.js';

/**
 * Azimuth measured from the direction of the equator, the way mounts are set up.
 *
 * @param azimuthRad - clockwise from north [rad, −2π to 4π]
 * @param latitudeRad - of the site, north positive [rad]; the equator itself counts as north
 * @returns clockwise from south (northern hemisphere) or from north (southern) [rad, −π to π]
 * @throws DomainError when the azimuth is not a number or turns more than the range says
 *
 * @example
 * degrees(azimuthFromEquatorRad(radians(90), radians(40))) // -90
 */
export function azimuthFromEquatorRad(azimuthRad: number, latitudeRad: number): number {
  requireRange('azimuth [rad]', azimuthRad, -2 * Math.PI, 4 * Math.PI);
  const equatorAzimuthRad = latitudeRad >= 0 ? Math.PI : 0;
  let fromEquatorRad = azimuthRad - equatorAzimuthRad;
  while (fromEquatorRad > Math.PI) fromEquatorRad -= 2 * Math.PI;
  while (fromEquatorRad < -Math.PI) fromEquatorRad += 2 * Math.PI;
  return fromEquatorRad;
}

/**
 * Azimuth travel, centred on the equator's direction, that follows the sun all year whenever it stands at or
 * above an elevation.
 *
 * The widest swing is on the summer solstice at the lowest elevation: there
 * cos A = (sin ε − sin φ sin h)/(cos φ cos h) with A from the pole's direction, and the travel is 2(π − A).
 * Where the sun passes on both sides of the zenith, or round the pole above that elevation, it is 2π.
 *
 * @param latitudeRad - north positive [rad, −π/2 to π/2]
 * @param elevationMinRad - lowest true elevation to be followed [rad, 0 to < π/2]
 * @returns travel end to end [rad, 0 to 2π]; 0 when the sun never reaches that elevation
 * @throws DomainError outside those ranges
 *
 * Source: spherical triangle; obliquity 23.44° (Meeus 1998, mean of 2000, rounded up).
 *
 * @example
 * degrees(azimuthTravelNeededRad(radians(41.4), 0)) // 244.05
 */
export function azimuthTravelNeededRad(latitudeRad: number, elevationMinRad: number): number {
  requireRange('latitude [rad]', latitudeRad, -Math.PI / 2, Math.PI / 2);
  requireRange('lowest elevation [rad]', elevationMinRad, 0, Math.PI / 2);
  if (elevationMinRad === Math.PI / 2) {
    throw new DomainError(
      'lowest elevation [rad]',
      elevationMinRad,
      'less than π/2: the azimuth of the zenith is undefined',
    );
  }
  const awayFromEquatorRad = Math.abs(latitudeRad);
  const solsticeNoonRad = Math.PI / 2 - Math.abs(awayFromEquatorRad - OBLIQUITY_RAD);
  if (solsticeNoonRad < elevationMinRad) return 0;
  if (awayFromEquatorRad <= OBLIQUITY_RAD) return 2 * Math.PI;
  const cosFromPole =
    (Math.sin(OBLIQUITY_RAD) - Math.sin(awayFromEquatorRad) * Math.sin(elevationMinRad)) /
    (Math.cos(awayFromEquatorRad) * Math.cos(elevationMinRad));
  if (cosFromPole >= 1) return 2 * Math.PI;
  return 2 * (Math.PI - Math.acos(Math.max(-1, cosFromPole)));
}

const OBLIQUITY_RAD = (23.44 * Math.PI) / 180;
