/** Weights by hour of day, a weekend factor and month factors, resolved to one multiplier a record. */
export interface Schedule {
  /** 24 weights, hours 0–1 … 23–24 of local standard time; only ratios count. */
  readonly hourlyWeights: readonly number[];
  /** Saturday and Sunday against a working day. */
  readonly weekendFactor: number;
  /** 12 factors, January first. */
  readonly monthFactors: readonly number[];
}
