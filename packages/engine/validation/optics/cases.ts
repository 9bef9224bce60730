/** Published, analytic and independently traced values of the dish's optics. */

/** Source: Rabl 1985, Active Solar Collectors and Their Applications; sun of half angle 0.2665°. */
export const CONCENTRATION_LIMITS = {
  any: 46_222,
  flatTarget: [
    { rimDeg: 45, concentration: 11_447 },
    { rimDeg: 60, concentration: 8_526 },
  ],
} as const;

/** Source: geometry of the parabola, f/D = 1/(4 tan(rim/2)). */
export const RIM_ANGLES = [
  { rimDeg: 45, focalRatio: 0.6036 },
  { rimDeg: 60, focalRatio: 0.433 },
  { rimDeg: 90, focalRatio: 0.25 },
] as const;

/** Sizes: common practice, no source (a dish of 15 ft). */
export const FIFTEEN_FOOT_DISH = { apertureDiameterM: 4.572, focalM: 2.743, squareSideM: 0.254 } as const;

/**
 * Intercept of that dish on its square; sun 2.73, specular 1 and tracking 2 mrad per axis.
 * Source: a ray trace computed independently.
 */
export const SQUARE_INTERCEPTS = [
  { slopeErrorRad: 0.003, intercept: 1.0 },
  { slopeErrorRad: 0.005, intercept: 0.9986 },
  { slopeErrorRad: 0.008, intercept: 0.9607 },
  { slopeErrorRad: 0.01, intercept: 0.8914 },
] as const;

/** Source: arithmetic, π(15 ft)²/4 over (10 in)². */
export const GEOMETRIC_CONCENTRATION = 254.5;

/** Source: arithmetic; the rating is common practice, no source. */
export const POWER_CLAIM = { statedPowerW: 4500, dniWm2: 900, beamShare: 0.3046 } as const;
