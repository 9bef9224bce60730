import { BOLTZMANN, ELEMENTARY_CHARGE, ZERO_CELSIUS_K } from '../constants.js';
import type { DishSettings } from '../optics/dish.js';
import { squareFluxDistribution } from '../optics/flux-map.js';
import type { CellReceiverSettings } from './settings.js';

/** One sun: the flux over which concentration is counted [W/m²]. Source: ASTM G173-03 rounds to it, convention. */
export const ONE_SUN_WM2 = 1000;

/**
 * A dense array of concentrator cells under uneven light.
 *
 * Efficiency of a cell on the light that falls on it:
 * η(C, T) = η_ref [1 + g ln(C/C_ref)] [1 − (C − C_ref)/C_series] [1 − β (T − T_ref)], g = n k T_ref/(q V_oc),
 * with the *local* concentration C and temperature T = plate + local flux × area resistance; no factor falls
 * below 0. An optimum concentration exists because voltage grows with ln C and series loss with C.
 *
 * Source: logarithmic growth of the open-circuit voltage and linear series loss, e.g. Luque & Hegedus,
 * Handbook of Photovoltaic Science and Engineering, concentrator chapters; value of each field as stated in it.
 */
export class CellArray {
  /** Local flux over mean flux of groups of nearly equally lit cells, and each group's share of the cells. */
  private readonly ratio: Float64Array;
  private readonly lnRatio: Float64Array;
  private readonly share: Float64Array;
  private readonly voltageGain: number;
  private readonly areaM2: number;
  /** Brightest cell over the mean [1]. */
  readonly peakRatio: number;
  /** What the stated grouping keeps of the sum of the cells' own powers [1]. */
  readonly groupingFactor: number;

  constructor(
    private readonly settings: CellReceiverSettings,
    dish: DishSettings,
  ) {
    const { cell, secondary, face, cellsPerSide } = settings;
    const ratios =
      secondary.kind === 'mixingDuct'
        ? evenlySpreadRatios(cellsPerSide ** 2, secondary.unevenness)
        : squareFluxDistribution(dish, face.sideM, cellsPerSide).relativeFlux;
    const groups = groupNearlyEqual(ratios);
    this.ratio = groups.ratio;
    this.share = groups.share;
    this.lnRatio = groups.ratio.map(Math.log);
    this.peakRatio = ratios.reduce((most, ratio) => Math.max(most, ratio), 0);
    this.groupingFactor = groupingFactor(
      ratios,
      settings.grouping,
      cell.operatingVoltageV,
      cell.bypassVoltageV,
    );
    this.voltageGain =
      (cell.idealityFactor * BOLTZMANN * (cell.referenceTemperatureC + ZERO_CELSIUS_K)) /
      (ELEMENTARY_CHARGE * cell.openCircuitVoltageV);
    this.areaM2 = face.sideM ** 2;
  }

  /**
   * Direct-current power of the array [W].
   * @param incidentW - light on the whole array [W, ≥ 0]
   * @param plateC - temperature of the cooled plate [°C]
   */
  powerW(incidentW: number, plateC: number): number {
    if (!(incidentW > 0)) return 0;
    const { cell, packingFraction } = this.settings;
    const meanFluxWm2 = incidentW / this.areaM2;
    const meanSuns = meanFluxWm2 / ONE_SUN_WM2;
    const lnOverReference = Math.log(meanSuns / cell.referenceConcentration);
    let weighted = 0;
    for (let group = 0; group < this.ratio.length; group++) {
      const ratio = this.ratio[group]!;
      const voltage = 1 + this.voltageGain * (lnOverReference + this.lnRatio[group]!);
      const series = 1 - (meanSuns * ratio - cell.referenceConcentration) / cell.seriesConcentration;
      const cellC = plateC + meanFluxWm2 * ratio * cell.areaResistanceM2KW;
      const warmth = 1 - cell.temperatureCoefficientPerK * (cellC - cell.referenceTemperatureC);
      if (voltage > 0 && series > 0 && warmth > 0)
        weighted += this.share[group]! * ratio * voltage * series * warmth;
    }
    return incidentW * packingFraction * cell.referenceEfficiency * weighted * this.groupingFactor;
  }

  /** Temperature of the most brightly lit cell [°C]. */
  hottestC(incidentW: number, plateC: number): number {
    return plateC + (incidentW / this.areaM2) * this.peakRatio * this.settings.cell.areaResistanceM2KW;
  }
}

/** Ratios spread evenly from 1 − u to 1 + u: midpoints of equal parts, so that their mean is 1. */
function evenlySpreadRatios(cells: number, unevenness: number): Float64Array {
  return Float64Array.from(
    { length: cells },
    (_, index) => 1 - unevenness + (2 * unevenness * (index + 0.5)) / cells,
  );
}

/** Cells whose light differs by less than this share one group [1]: it moves the array's power by less than 1e-5. */
const GROUP_SPREAD = 0.02;

/** Sorts cells into groups of nearly equal light, each standing for the mean of its cells. */
function groupNearlyEqual(ratios: Float64Array): { ratio: Float64Array; share: Float64Array } {
  const sorted = Float64Array.from(ratios).sort();
  const groups: { sum: number; count: number; first: number }[] = [];
  for (const ratio of sorted) {
    const group = groups.at(-1);
    if (group && ratio <= group.first * (1 + GROUP_SPREAD)) {
      group.sum += ratio;
      group.count++;
    } else if (ratio > 0) {
      groups.push({ sum: ratio, count: 1, first: ratio });
    }
  }
  return {
    ratio: Float64Array.from(groups, ({ sum, count }) => sum / count),
    share: Float64Array.from(groups, ({ count }) => count / ratios.length),
  };
}

/**
 * Share of the cells' summed power that a grouping keeps.
 *
 * In a string with bypass the best of working at the k brightest cells' current is taken:
 * max over k of i_k (k V − (N − k) V_bypass), cells sorted by current; without bypass the weakest cell's current
 * flows through all; in parallel nothing is lost. Currents are proportional to the local flux.
 *
 * @param ratios - local flux over mean flux of each cell
 * @param workingV - working voltage of a cell [V, > 0]
 * @param bypassV - voltage across a bypass [V, ≥ 0]
 * @returns 0 to 1
 *
 * Source: Kirchhoff's laws with cells of one working voltage.
 */
export function groupingFactor(
  ratios: Float64Array,
  grouping: CellReceiverSettings['grouping'],
  workingV: number,
  bypassV: number,
): number {
  if (grouping === 'parallel') return 1;
  const sorted = Float64Array.from(ratios).sort().reverse();
  const cells = sorted.length;
  const summed = sorted.reduce((total, current) => total + current, 0) * workingV;
  if (!(summed > 0)) return 0;
  if (grouping === 'seriesString') return (sorted[cells - 1]! * cells * workingV) / summed;
  let best = 0;
  for (let working = 1; working <= cells; working++) {
    best = Math.max(best, sorted[working - 1]! * (working * workingV - (cells - working) * bypassV));
  }
  return best / summed;
}
