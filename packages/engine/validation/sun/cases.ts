/** Published sun positions, air masses and fractions. Angles in degrees, azimuth clockwise from north. */

/** Source: Reda & Andreas 2004, Solar Energy 76:577, worked example in the appendix. */
export const REDA_ANDREAS_EXAMPLE = {
  utcMs: Date.UTC(2003, 9, 17, 19, 30, 30),
  latitudeDeg: 39.742476,
  longitudeDeg: -105.1786,
  pressurePa: 82_000,
  dryBulbC: 11,
  zenithDeg: 50.11162,
  azimuthDeg: 194.34024,
  /** Steps on the way, in the paper's table of results; value from memory. */
  trueElevationDeg: 39.872046,
  refractionDeg: 0.016332,
} as const;

/** Source: Kasten & Young 1989, Applied Optics 28:4735: formula's values at whole zenith angles. */
export const AIR_MASSES = [
  { zenithDeg: 60, airMass: 1.994 },
  { zenithDeg: 85, airMass: 10.31 },
  { zenithDeg: 90, airMass: 37.92 },
] as const;

/** Source: Erbs, Klein & Duffie 1982, Solar Energy 28:293, eq. 1 worked out at one index in its middle branch. */
export const DIFFUSE_FRACTION = { clearnessIndex: 0.5, fraction: 0.6592 } as const;

/**
 * Source: Duffie & Beckman, Solar Engineering of Thermal Processes, worked example 1.6.1 (value from memory):
 * 13 February (day 44), 10:30 solar time, 43° N, plane tilted 45° and facing 15° west of south.
 */
export const INCIDENCE_EXAMPLE = {
  dayOfYear: 44,
  solarHour: 10.5,
  latitudeDeg: 43,
  tiltDeg: 45,
  planeAzimuthDeg: 195,
  incidenceDeg: 35.0,
} as const;

/** Latitudes of the year-long comparison: both hemispheres, a tropic, the equator and inside a polar circle. */
export const YEAR_LATITUDES_DEG = [-35, 0, 23.4, 41.4, 68] as const;
