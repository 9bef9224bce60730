/** How far each check of the optics may be off, and why so much. */
export const OPTICS_TOLERANCES = {
  /** Published values have four or five figures. */
  concentrationRelative: 1e-3,
  focalRatio: 1e-4,
  /** The closed form leaves out terms of the order of the rim angle squared. */
  smallRimIntercept: 1e-3,
  /** Noise of the independent trace and its finite rays. */
  tracedIntercept: 0.003,
  /** Standard errors of our own trace: four leave one chance in 16 000 of a false alarm, and the seed is fixed. */
  monteCarloSigmas: 4,
  claimShareRelative: 1e-3,
  /** What the rings and panels of the quadrature promise. */
  convergence: 1e-6,
} as const;
