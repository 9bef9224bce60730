/**
 * How much the air lifts the sun, for given pressure and temperature.
 *
 * The relation is used from the upper limb on the horizon upwards; further down the sun is not seen and no
 * correction is made, as in the source.
 *
 * @param trueElevationRad - elevation of the sun's centre without air [rad, −π/2 to π/2]
 * @param pressurePa - pressure at the site, mean over the year or of the moment [Pa, > 0]
 * @param dryBulbC - air temperature [°C, > −273]
 * @returns lift to be added to the true elevation [rad]
 *
 * Source: Reda & Andreas 2004, Solar Energy 76:577, eq. 42 (0.26667° is the sun's half width, 0.5667° the
 * refraction at the horizon).
 *
 * @example
 * degrees(refractionRad(radians(10), 101000, 10)) // 0.0901
 */
export function refractionRad(trueElevationRad: number, pressurePa: number, dryBulbC: number): number {
  const elevationDeg = trueElevationRad * DEG_PER_RAD;
  if (elevationDeg < -(SUN_HALF_WIDTH_DEG + HORIZON_REFRACTION_DEG)) return 0;
  const densityFactor = (pressurePa / 101000) * (283 / (273 + dryBulbC));
  const liftDeg =
    (densityFactor * 1.02) / (60 * Math.tan((elevationDeg + 10.3 / (elevationDeg + 5.11)) / DEG_PER_RAD));
  return liftDeg / DEG_PER_RAD;
}

/**
 * The refraction that `suncalc` 2 adds to every altitude: Meeus, Astronomical Algorithms, eq. 16.4, held at
 * its value for the horizon below it. Needed only to be taken away again.
 *
 * @param trueElevationRad - elevation without air [rad]
 * @returns lift [rad]
 */
export function suncalcRefractionRad(trueElevationRad: number): number {
  const h = trueElevationRad > 0 ? trueElevationRad : 0;
  return 0.0002967 / Math.tan(h + 0.00312536 / (h + 0.08901179));
}

/**
 * Takes suncalc's refraction away, by fixed point: the true elevation h solves h + R(h) = apparent. |R′| is
 * at most 0.15 (on the horizon), so each round gains at least 0.8 of a digit and the loop always ends.
 *
 * @param apparentElevationRad - altitude given by suncalc [rad]
 * @returns true elevation [rad], within 1e-15
 *
 * @example
 * trueFromSuncalcRad(0.2 + suncalcRefractionRad(0.2)) // 0.2
 */
export function trueFromSuncalcRad(apparentElevationRad: number): number {
  let trueRad = apparentElevationRad;
  for (let round = 0; round < 40; round++) {
    const next = apparentElevationRad - suncalcRefractionRad(trueRad);
    const change = next - trueRad;
    trueRad = next;
    if (change < 1e-15 && change > -1e-15) break;
  }
  return trueRad;
}

const DEG_PER_RAD = 180 / Math.PI;
const SUN_HALF_WIDTH_DEG = 0.26667;
const HORIZON_REFRACTION_DEG = 0.5667;
