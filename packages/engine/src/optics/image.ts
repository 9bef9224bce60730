import { besselI0Scaled } from './bessel.js';
import { type DishSettings, focalLengthM, requireDish } from './dish.js';
import { gaussLegendre } from './quadrature.js';

/** One ring of the dish and the Gaussian image it throws on the focal plane. */
export interface ImageRing {
  /** Share of the aperture; the rings' shares sum to 1. */
  readonly areaShare: number;
  /** Standard deviations of the image across and along the ring's radius [m]. */
  readonly tangentialM: number;
  readonly radialM: number;
}

/** Rings used everywhere; doubling them moves no intercept by 1e-6 (test beside `intercept.ts`). */
export const RING_COUNT = 40;

/**
 * The rings of a dish with their images in the focal plane.
 *
 * A ring at angle ψ from the axis lies p = 2f/(1 + cos ψ) from the focus. Across the radius the beam has
 * σ_t² = σ_sun² + (2σ_slope cos(ψ/2))² + σ_specular² + σ_tracking², along it
 * σ_r² = σ_sun² + (2σ_slope)² + σ_specular² + σ_tracking²; the image is p·σ_t by p·σ_r/cos ψ, since the focal
 * plane cuts the cone slantwise.
 *
 * @param dish - the dish
 * @param count - number of rings: Gauss–Legendre in v, where 1 − v³ of the aperture lies inside the ring. They
 *   crowd at the rim, since with a rim near 90° the image of the last rings grows without bound
 * @returns rings from the rim to the vertex; their shares of the area sum to 1
 * @throws DomainError naming the quantity of the dish that is out of range
 *
 * Source: geometry of the paraboloid (r = 2f tan(ψ/2)); addition of independent Gaussian errors, Rabl 1985,
 * Active Solar Collectors and Their Applications. A tilt of the normal out of the plane of incidence turns
 * the ray by 2 cos(incidence), and the incidence on a paraboloid is ψ/2.
 */
export function imageRings(dish: DishSettings, count: number = RING_COUNT): ImageRing[] {
  requireDish(dish);
  const { nodes, weights } = gaussLegendre(count);
  const focalM = focalLengthM(dish);
  const commonVariance = dish.sunWidthRad ** 2 + dish.specularErrorRad ** 2 + dish.trackingErrorRad ** 2;
  const rimRadiusM = dish.apertureDiameterM / 2;
  return Array.from(nodes, (node, i) => {
    const areaInside = 1 - node ** 3;
    const angleRad = 2 * Math.atan((rimRadiusM * Math.sqrt(areaInside)) / (2 * focalM));
    const distanceM = (2 * focalM) / (1 + Math.cos(angleRad));
    const radialVariance = commonVariance + (2 * dish.slopeErrorRad) ** 2;
    const tangentialVariance = commonVariance + (2 * dish.slopeErrorRad * Math.cos(angleRad / 2)) ** 2;
    return {
      areaShare: weights[i]! * 3 * node ** 2,
      tangentialM: distanceM * Math.sqrt(tangentialVariance),
      radialM: (distanceM * Math.sqrt(radialVariance)) / Math.cos(angleRad),
    };
  });
}

/**
 * Probability density of a ring's light at a distance from the focus. All the ring's orientations together
 * make the image round, so the density depends on the distance only.
 *
 * @param ring - the ring's image
 * @param distanceM - from the focus, in the focal plane [m, ≥ 0]
 * @returns density [1/m²]; its integral over the plane is 1
 *
 * Source: mean over the angle of the elliptical Gaussian; with σ₁ ≥ σ₂ it is
 * exp(−ρ²/2σ₁²) · e⁻ˣI₀(x)/(2πσ₁σ₂), x = (ρ²/4)(1/σ₂² − 1/σ₁²) (from Abramowitz & Stegun 1964, 9.6.16).
 */
export function ringDensity(ring: ImageRing, distanceM: number): number {
  const longer = Math.max(ring.radialM, ring.tangentialM);
  const shorter = Math.min(ring.radialM, ring.tangentialM);
  const square = distanceM * distanceM;
  const x = (square / 4) * (1 / (shorter * shorter) - 1 / (longer * longer));
  return (Math.exp(-square / (2 * longer * longer)) * besselI0Scaled(x)) / (2 * Math.PI * longer * shorter);
}
