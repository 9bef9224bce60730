/** How far each check of the sun may be off, and why so much. */
export const SUN_TOLERANCES = {
  /** The low-precision series for the sun's longitude is good to 0.01°; half of that for a single instant. */
  publishedExampleDeg: 0.005,
  /** Pure arithmetic on the paper's own elevation; its last digit is the sixth. */
  refractionDeg: 1e-6,
  /**
   * Mean error in elevation: the series errs both ways and averages out (0.000002° seen), a forgotten parallax
   * would not (0.0017°).
   */
  yearElevationBiasDeg: 0.0005,
  /** Same series over a whole year: worst case, with room for the years it drifts (0.0094° seen in 2025). */
  yearSeparationDeg: 0.02,
  /**
   * The 512 reference positions reach from 1910 to 2210, beyond the years the clock correction is fitted to,
   * and were made with no clock correction at all (0.0117° seen).
   */
  referenceSeparationDeg: 0.02,
  /** The published values have four figures. */
  airMassRelative: 1e-3,
  diffuseFraction: 1e-3,
  /** The worked example rounds its declination to a degree and its result to a tenth. */
  incidenceDeg: 0.5,
} as const;
