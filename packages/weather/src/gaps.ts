/** Longest gap that is filled by a straight line [h]. Source: project rule, model section 2. */
export const LONGEST_FILLED_GAP_HOURS = 3;

export interface Gap {
  /** First missing record. */
  readonly from: number;
  /** Record after the last missing one. */
  readonly to: number;
}

/** Runs of NaN in a column. */
export function findGaps(column: Float64Array): Gap[] {
  const gaps: Gap[] = [];
  for (let at = 0; at < column.length; at += 1) {
    if (!Number.isNaN(column[at])) continue;
    const from = at;
    while (at < column.length && Number.isNaN(column[at])) at += 1;
    gaps.push({ from, to: at });
  }
  return gaps;
}

/**
 * Fills one gap in place with a straight line between its neighbours. At either end of the year there is
 * only one neighbour, whose value is held: joining 31 December to 1 January would mix two years.
 */
export function fillGap(column: Float64Array, gap: Gap): void {
  const before = gap.from > 0 ? column[gap.from - 1] : undefined;
  const after = gap.to < column.length ? column[gap.to] : undefined;
  const left = before ?? after;
  const right = after ?? before;
  if (left === undefined || right === undefined) return;
  const steps = gap.to - gap.from + 1;
  for (let at = gap.from; at < gap.to; at += 1) {
    column[at] = left + ((right - left) * (at - gap.from + 1)) / steps;
  }
}
