/** Where the power of one step goes and comes from [W]. */
export interface Dispatch {
  acW: number;
  inverterLossW: number;
  ownUseW: number;
  importW: number;
  exportW: number;
}

export function createDispatch(): Dispatch {
  return { acW: 0, inverterLossW: 0, ownUseW: 0, importW: 0, exportW: 0 };
}

/**
 * Own use first, then export; what is missing is bought.
 *
 * @param dcW - direct current from the receiver [W, ≥ 0]
 * @param inverter - its loss at that input; null where the receiver makes no power
 * @param useW - site, pump and tracker together [W, ≥ 0]
 * @param out - receives the result
 */
export function dispatchPower(
  dcW: number,
  inverter: { lossW(dcW: number): number } | null,
  useW: number,
  out: Dispatch,
): void {
  out.inverterLossW = inverter ? inverter.lossW(dcW) : 0;
  out.acW = dcW - out.inverterLossW;
  out.ownUseW = Math.min(out.acW, useW);
  out.exportW = Math.max(0, out.acW - useW);
  out.importW = Math.max(0, useW - out.acW);
}
