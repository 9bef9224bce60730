import { requireRange } from '../errors.js';
import type { DishSettings } from './dish.js';
import { type ImageRing, imageRings, ringDensity } from './image.js';
import { gaussLegendre } from './quadrature.js';

/**
 * Share of the reflected beam that falls on a flat square in the focal plane, centred on the focus.
 *
 * Once averaged over the orientation each ring's image is round, so the square needs one integral in the
 * distance ρ from the focus: all of the circle counts up to the half side a, and the share 1 − (4/π)acos(a/ρ)
 * of it from there to the corner.
 *
 * @param dish - the dish
 * @param sideM - side of the square [m, > 0, at most the dish's diameter]
 * @param rings - rings of the dish; the default is converged to 1e-6
 * @returns intercept factor [0 to 1]
 * @throws DomainError for an impossible dish or side
 *
 * Source: the ring images of `imageRings`; the rest is geometry.
 *
 * @example
 * squareIntercept(dish(4.572, 0.6, 0.005), 0.254) // 0.9986
 */
export function squareIntercept(dish: DishSettings, sideM: number, rings = imageRings(dish)): number {
  requireRange('side of the square [m]', sideM, Number.MIN_VALUE, dish.apertureDiameterM);
  const halfM = sideM / 2;
  let intercept = 0;
  for (const ring of rings) {
    intercept += ring.areaShare * (lightInside(ring, halfM) + lightInCorners(ring, halfM));
  }
  return Math.min(1, intercept);
}

/**
 * Share of the reflected beam that falls on a flat disc in the focal plane, centred on the focus.
 *
 * @param dish - the dish
 * @param radiusM - radius of the disc [m, > 0, at most the dish's radius]
 * @param rings - rings of the dish; the default is converged to 1e-6
 * @returns intercept factor [0 to 1]
 * @throws DomainError for an impossible dish or radius
 *
 * Source: the ring images of `imageRings`. For a small rim angle it tends to 1 − exp(−a²/2f²σ²).
 *
 * @example
 * roundIntercept(dish(4.572, 0.6, 0.005), 0.127) // 0.9971
 */
export function roundIntercept(dish: DishSettings, radiusM: number, rings = imageRings(dish)): number {
  requireRange('radius of the disc [m]', radiusM, Number.MIN_VALUE, dish.apertureDiameterM / 2);
  let intercept = 0;
  for (const ring of rings) intercept += ring.areaShare * lightInside(ring, radiusM);
  return Math.min(1, intercept);
}

/**
 * Share of a ring's light within a circle. The panels double in width from the image's shorter deviation, so
 * that a needle-shaped image (rim angle near 90°) is as well resolved as a round one.
 */
function lightInside(ring: ImageRing, radiusM: number): number {
  const endM = Math.min(radiusM, FAR_SIGMAS * Math.max(ring.radialM, ring.tangentialM));
  let light = 0;
  let fromM = 0;
  let toM = 2 * Math.min(ring.radialM, ring.tangentialM);
  while (fromM < endM) {
    const widthM = Math.min(toM, endM) - fromM;
    for (let i = 0; i < panel.nodes.length; i++) {
      const distanceM = fromM + widthM * panel.nodes[i]!;
      light += panel.weights[i]! * widthM * 2 * Math.PI * distanceM * ringDensity(ring, distanceM);
    }
    fromM += widthM;
    toM *= 2;
  }
  return light;
}

/** Share of a ring's light in the four corners beyond the inscribed circle; ρ = a sec θ takes the root out of acos. */
function lightInCorners(ring: ImageRing, halfM: number): number {
  if (halfM > FAR_SIGMAS * Math.max(ring.radialM, ring.tangentialM)) return 0;
  let light = 0;
  for (let i = 0; i < panel.nodes.length; i++) {
    const angleRad = (panel.nodes[i]! * Math.PI) / 4;
    const distanceM = halfM / Math.cos(angleRad);
    const widthM = distanceM * Math.tan(angleRad) * (Math.PI / 4) * panel.weights[i]!;
    const shareOfCircle = 1 - (4 * angleRad) / Math.PI;
    light += widthM * shareOfCircle * 2 * Math.PI * distanceM * ringDensity(ring, distanceM);
  }
  return light;
}

/** Light further out than this many standard deviations is below 1e-17 of the whole. */
const FAR_SIGMAS = 9;
const panel = gaussLegendre(20);
