/**
 * Mixes layers that lie under colder ones: neighbours are merged to their mean until no layer is warmer than
 * the one above it. Layers have equal mass, so the sum of the values, and with it the energy, stays as it is.
 *
 * The result is the nearest ordering in the least-squares sense, found in one pass (pool adjacent violators).
 * Water's density maximum at 4 °C is left out: below it the warmer water would sink.
 *
 * @param enthalpyJkg of each layer, bottom first **[J/kg]**; changed in place
 * @param blockSum scratch as long as enthalpyJkg
 * @param blockCount scratch as long as enthalpyJkg
 *
 * Source of the method: Barlow, Bartholomew, Bremner & Brunk 1972, Statistical Inference under Order Restrictions.
 */
export function mixInversions(
  enthalpyJkg: Float64Array,
  blockSum: Float64Array,
  blockCount: Int32Array,
): void {
  const layers = enthalpyJkg.length;
  let first = 1;
  while (first < layers && enthalpyJkg[first]! >= enthalpyJkg[first - 1]!) first++;
  if (first >= layers) return;
  let blocks = 0;
  for (let i = 0; i < layers; i++) {
    let sum = enthalpyJkg[i]!;
    let count = 1;
    // Compared as means: sum/count of the block below against the mean of this one.
    while (blocks > 0 && blockSum[blocks - 1]! * count > sum * blockCount[blocks - 1]!) {
      blocks--;
      sum += blockSum[blocks]!;
      count += blockCount[blocks]!;
    }
    blockSum[blocks] = sum;
    blockCount[blocks] = count;
    blocks++;
  }
  let i = 0;
  for (let block = 0; block < blocks; block++) {
    const count = blockCount[block]!;
    // A layer that was not merged keeps its value to the last bit (sum/1).
    const mean = blockSum[block]! / count;
    for (let k = 0; k < count; k++) enthalpyJkg[i++] = mean;
  }
}
