export interface Spread {
  readonly min: number;
  readonly median: number;
  readonly max: number;
}

/** Least, middle and greatest of an odd number of values. */
export function summarise(values: readonly number[]): Spread {
  const sorted = [...values].sort((a, b) => a - b);
  return { min: sorted[0]!, median: sorted[sorted.length >> 1]!, max: sorted.at(-1)! };
}
