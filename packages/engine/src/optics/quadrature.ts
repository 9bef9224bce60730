import { DomainError } from '../errors.js';

/** Nodes in (0, 1) and weights that sum to 1. */
export interface UnitQuadrature {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

/**
 * Gauss–Legendre quadrature on the unit interval: exact for polynomials up to degree 2n − 1.
 *
 * @param order - number of nodes n [1 to 256]
 * @returns nodes in rising order and their weights
 * @throws DomainError for any other order
 *
 * Source: nodes are the roots of the Legendre polynomial Pₙ, weights 2/((1 − x²)Pₙ′(x)²) (Abramowitz & Stegun
 * 1964, 25.4.29), found by Newton's method from cos π(i − 1/4)/(n + 1/2).
 */
export function gaussLegendre(order: number): UnitQuadrature {
  if (!Number.isInteger(order) || order < 1 || order > 256) {
    throw new DomainError('quadrature order', order, 'a whole number from 1 to 256');
  }
  const nodes = new Float64Array(order);
  const weights = new Float64Array(order);
  for (let i = 0; i < order; i++) {
    let x = -Math.cos((Math.PI * (i + 0.75)) / (order + 0.5));
    let slope = 1;
    for (let round = 0; round < 20; round++) {
      let previous = 0;
      let value = 1;
      for (let k = 1; k <= order; k++) {
        const next = ((2 * k - 1) * x * value - (k - 1) * previous) / k;
        previous = value;
        value = next;
      }
      slope = (order * (previous - x * value)) / (1 - x * x);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-15) break;
    }
    nodes[i] = (1 + x) / 2;
    weights[i] = 1 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
