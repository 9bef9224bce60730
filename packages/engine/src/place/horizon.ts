import { DomainError, requireRange } from '../errors.js';

/** One surveyed direction of a horizon profile. */
export interface HorizonPoint {
  /** Clockwise from north [rad, 0 to 2π]. */
  readonly azimuthRad: number;
  /** Height of what stands there above the level, as seen from the dish [rad, 0 to π/2]. */
  readonly elevationRad: number;
}

const TURN_RAD = 2 * Math.PI;

/** Sun-blocking elevation by direction, ready to be asked many times. */
export class HorizonProfile {
  private readonly azimuthsRad: Float64Array;
  private readonly elevationsRad: Float64Array;

  /**
   * @param points - in any order; none at all is a level horizon, a single one the same height all round
   * @throws DomainError naming the point that is out of its range, or a direction that stands there twice
   */
  constructor(points: readonly HorizonPoint[]) {
    for (const [index, { azimuthRad, elevationRad }] of points.entries()) {
      requireRange(`azimuth of horizon point ${index + 1} [rad]`, azimuthRad, 0, TURN_RAD);
      requireRange(`elevation of horizon point ${index + 1} [rad]`, elevationRad, 0, Math.PI / 2);
    }
    const sorted = points
      .map(({ azimuthRad, elevationRad }) => ({ azimuthRad: azimuthRad % TURN_RAD, elevationRad }))
      .sort((one, other) => one.azimuthRad - other.azimuthRad);
    this.azimuthsRad = Float64Array.from(sorted, ({ azimuthRad }) => azimuthRad);
    this.elevationsRad = Float64Array.from(sorted, ({ elevationRad }) => elevationRad);
    for (let index = 1; index < sorted.length; index++) {
      const azimuthRad = this.azimuthsRad[index]!;
      if (azimuthRad === this.azimuthsRad[index - 1]) {
        throw new DomainError('azimuth of a horizon point [rad]', azimuthRad, 'each direction once');
      }
    }
  }

  /** Elevation of the horizon in a direction [rad]; see {@link horizonElevationRad}. */
  elevationRad(azimuthRad: number): number {
    const { azimuthsRad, elevationsRad } = this;
    const last = azimuthsRad.length - 1;
    if (last < 0) return 0;
    if (last === 0) return elevationsRad[0]!;
    const wrapped = azimuthRad % TURN_RAD;
    const direction = wrapped < 0 ? wrapped + TURN_RAD : wrapped;
    // First point beyond the direction; past the last one it is the first, a turn further on.
    let low = 0;
    let high = last + 1;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (azimuthsRad[middle]! > direction) high = middle;
      else low = middle + 1;
    }
    const before = low === 0 ? last : low - 1;
    const beyond = low > last ? 0 : low;
    const fromRad = azimuthsRad[before]! - (low === 0 ? TURN_RAD : 0);
    const toRad = azimuthsRad[beyond]! + (low > last ? TURN_RAD : 0);
    const share = (direction - fromRad) / (toRad - fromRad);
    return elevationsRad[before]! * (1 - share) + elevationsRad[beyond]! * share;
  }
}

/**
 * Elevation of a horizon profile in a direction, linear in azimuth between the two points beside it; between
 * the last point and the first the line goes on through north.
 *
 * @param points - of the profile, in any order
 * @param azimuthRad - direction, clockwise from north [rad, −2π to 4π]
 * @returns [rad, 0 to π/2]
 * @throws DomainError for a point or direction out of its range, or a direction that stands there twice
 *
 * Source: linear interpolation on the circle; how surveyed profiles are commonly read, no source.
 *
 * @example
 * degrees(horizonElevationRad([{azimuthRad: radians(350), elevationRad: radians(4)}, {azimuthRad: radians(20), elevationRad: radians(10)}], radians(5))) // 7.0
 */
export function horizonElevationRad(points: readonly HorizonPoint[], azimuthRad: number): number {
  requireRange('azimuth [rad]', azimuthRad, -TURN_RAD, 2 * TURN_RAD);
  return new HorizonProfile(points).elevationRad(azimuthRad);
}
