import { DomainError, requireRange } from '../errors.js';
import { apertureAreaM2, type DishSettings } from './dish.js';
import { imageRings, ringDensity } from './image.js';
import { gaussLegendre } from './quadrature.js';

/**
 * Flux in the focal plane at given distances from the focus, before any optical loss.
 *
 * Multiply by DNI, reflectance, cleanliness and 1 − shadow fraction for W/m². Times 2πρ and integrated to a
 * radius it is the gross aperture times the round intercept.
 *
 * @param dish - the dish
 * @param radiiM - distances from the focus [m, ≥ 0]
 * @param rings - rings of the dish
 * @returns suns (flux over DNI) at each distance; the largest is at the focus
 * @throws DomainError for an impossible dish or a distance that is negative or not a number
 *
 * Source: the ring images of `imageRings`.
 */
export function radialFluxMap(
  dish: DishSettings,
  radiiM: Float64Array,
  rings = imageRings(dish),
): Float64Array {
  const areaM2 = apertureAreaM2(dish);
  return radiiM.map((radiusM) => {
    requireRange('distance from the focus [m]', radiusM, 0, Number.MAX_VALUE);
    let density = 0;
    for (const ring of rings) density += ring.areaShare * ringDensity(ring, radiusM);
    return areaM2 * density;
  });
}

/** How the light that falls on a square is spread over equal square cells. */
export interface SquareFluxDistribution {
  readonly cellsPerSide: number;
  /** Mean flux on each cell over the mean flux on the square, row by row; the mean of all is 1. */
  readonly relativeFlux: Float64Array;
  /** Largest entry of `relativeFlux`: mean of the brightest cell over mean of the square. */
  readonly unevenness: number;
  /** Mean flux on the square over DNI, before any optical loss [suns]. */
  readonly meanSuns: number;
  /** Flux at the focus over DNI, before any optical loss [suns]. */
  readonly peakSuns: number;
}

/**
 * Relative flux on each cell of a square array in the focal plane, centred on the focus.
 *
 * @param dish - the dish
 * @param sideM - side of the square [m, > 0, at most the dish's diameter]
 * @param cellsPerSide - cells along a side [1 to 100]
 * @returns the distribution; mean flux on the square is gross aperture × square intercept ÷ its area
 * @throws DomainError for an impossible dish, side or number of cells
 *
 * Source: `radialFluxMap` integrated over each cell by Gauss–Legendre; one eighth of the square is computed
 * and mirrored.
 */
export function squareFluxDistribution(
  dish: DishSettings,
  sideM: number,
  cellsPerSide: number,
): SquareFluxDistribution {
  requireRange('side of the square [m]', sideM, Number.MIN_VALUE, dish.apertureDiameterM);
  if (!Number.isInteger(cellsPerSide) || cellsPerSide < 1 || cellsPerSide > 100) {
    throw new DomainError('cells per side', cellsPerSide, 'a whole number from 1 to 100');
  }
  const rings = imageRings(dish);
  const narrowestM = rings.reduce((least, ring) => Math.min(least, ring.tangentialM, ring.radialM), Infinity);
  const cellM = sideM / cellsPerSide;
  const { nodes, weights } = gaussLegendre(nodesAcross(cellM / narrowestM));
  const radiiM = new Float64Array(nodes.length ** 2);
  const cellMeanSuns = (column: number, row: number): number => {
    for (let i = 0; i < nodes.length; i++) {
      for (let j = 0; j < nodes.length; j++) {
        const x = (column + nodes[i]!) * cellM - sideM / 2;
        const y = (row + nodes[j]!) * cellM - sideM / 2;
        radiiM[i * nodes.length + j] = Math.hypot(x, y);
      }
    }
    const suns = radialFluxMap(dish, radiiM, rings);
    return suns.reduce(
      (sum, flux, k) => sum + flux * weights[Math.floor(k / nodes.length)]! * weights[k % nodes.length]!,
      0,
    );
  };

  const cellSuns = new Float64Array(cellsPerSide ** 2);
  const last = cellsPerSide - 1;
  for (let row = 0; row <= last / 2; row++) {
    for (let column = 0; column <= row; column++) {
      const suns = cellMeanSuns(column, row);
      for (const [a, b] of [
        [column, row],
        [row, column],
      ] as const) {
        cellSuns[b * cellsPerSide + a] = suns;
        cellSuns[b * cellsPerSide + last - a] = suns;
        cellSuns[(last - b) * cellsPerSide + a] = suns;
        cellSuns[(last - b) * cellsPerSide + last - a] = suns;
      }
    }
  }
  const meanSuns = cellSuns.reduce((sum, suns) => sum + suns, 0) / cellSuns.length;
  const relativeFlux = cellSuns.map((suns) => suns / meanSuns);
  return {
    cellsPerSide,
    relativeFlux,
    unevenness: relativeFlux.reduce((most, flux) => Math.max(most, flux), 0),
    meanSuns,
    peakSuns: radialFluxMap(dish, new Float64Array(1), rings)[0]!,
  };
}

/** Enough nodes to integrate a Gaussian over a cell that many standard deviations wide. */
function nodesAcross(cellSigmas: number): number {
  return Math.max(4, Math.min(64, Math.ceil(4 + 3 * cellSigmas)));
}
