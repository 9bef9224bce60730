import { requireRange } from '../errors.js';

/** Half the angle the sun fills, seen from the earth at its mean distance: 0.2665° [rad]. Source: Rabl 1985. */
export const SUN_HALF_ANGLE_RAD = (0.2665 * Math.PI) / 180;

/**
 * The most any optics in air can concentrate a source of given half angle.
 *
 * @param halfAngleRad - half angle of the source [rad, > 0 to π/2]
 * @returns concentration ratio
 * @throws DomainError outside that range
 *
 * Source: Rabl 1985, Active Solar Collectors and Their Applications, 1/sin²θ.
 *
 * @example
 * idealConcentration(SUN_HALF_ANGLE_RAD) // 46222.6
 */
export function idealConcentration(halfAngleRad: number = SUN_HALF_ANGLE_RAD): number {
  requireRange('half angle of the source [rad]', halfAngleRad, Number.MIN_VALUE, Math.PI / 2);
  return 1 / Math.sin(halfAngleRad) ** 2;
}

/**
 * The most an ideal paraboloid can concentrate the sun on a flat target in its focal plane that takes every
 * ray; the target's shadow on the dish is off (the −1).
 *
 * @param rimRad - rim angle [rad, > 0 to π/2]
 * @param halfAngleRad - half angle of the source [rad, > 0 to π/2]
 * @returns concentration ratio; 0 where the target would shade all it could collect
 * @throws DomainError outside those ranges
 *
 * Source: Rabl 1985, sin²φ cos²(φ + θ)/sin²θ − 1.
 *
 * @example
 * idealFlatTargetConcentration(radians(45)) // 11447
 */
export function idealFlatTargetConcentration(
  rimRad: number,
  halfAngleRad: number = SUN_HALF_ANGLE_RAD,
): number {
  requireRange('rim angle [rad]', rimRad, Number.MIN_VALUE, Math.PI / 2);
  requireRange('half angle of the source [rad]', halfAngleRad, Number.MIN_VALUE, Math.PI / 2);
  // Beyond 90° a ray from the rim can no longer reach the front of the target.
  if (rimRad + halfAngleRad >= Math.PI / 2) return 0;
  const ratio = (Math.sin(rimRad) * Math.cos(rimRad + halfAngleRad)) / Math.sin(halfAngleRad);
  return Math.max(0, ratio ** 2 - 1);
}
