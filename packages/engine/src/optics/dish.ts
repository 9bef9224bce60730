import { requireRange } from '../errors.js';

/** A paraboloidal dish. Errors are one standard deviation *per axis*. */
export interface DishSettings {
  readonly apertureDiameterM: number;
  /** Focal length over aperture diameter; under 0.25 the rim would light the back of a flat receiver. */
  readonly focalRatio: number;
  /** Of the mirror's normal; the ray turns by twice as much [rad]. */
  readonly slopeErrorRad: number;
  /** Width of the sun's brightness as a Gaussian [rad]; 2.73 mrad for a clear sky. */
  readonly sunWidthRad: number;
  /** Scatter of the reflected ray by the surface's finish [rad]. */
  readonly specularErrorRad: number;
  /** Of the whole dish against the sun [rad]. */
  readonly trackingErrorRad: number;
  /** Of the clean mirror [0 to 1]. */
  readonly reflectance: number;
  /** Share of the clean reflectance that dust leaves [0 to 1]. */
  readonly cleanliness: number;
  /** Share of the gross aperture shaded by receiver and struts [0 to 1). */
  readonly shadowFraction: number;
}

/**
 * Refuses a dish that is not one.
 *
 * @param dish - settings to check
 * @throws DomainError naming the first quantity out of range
 */
export function requireDish(dish: DishSettings): void {
  requireRange('aperture diameter [m]', dish.apertureDiameterM, 0.01, 100);
  requireRange('focal ratio f/D', dish.focalRatio, 0.25, 10);
  requireRange('slope error [rad]', dish.slopeErrorRad, 0, MAX_ERROR_RAD);
  // A sun with width keeps the image finite, however good the mirror.
  requireRange('sun width [rad]', dish.sunWidthRad, 1e-4, MAX_ERROR_RAD);
  requireRange('specular error [rad]', dish.specularErrorRad, 0, MAX_ERROR_RAD);
  requireRange('tracking error [rad]', dish.trackingErrorRad, 0, MAX_ERROR_RAD);
  requireRange('reflectance', dish.reflectance, 0, 1);
  requireRange('cleanliness', dish.cleanliness, 0, 1);
  requireRange('shadow fraction', dish.shadowFraction, 0, 1);
}

/**
 * Angle at the focus between the axis and the rim.
 *
 * @param dish - diameter is not used
 * @returns rim angle [rad, 0 to π/2]
 *
 * Source: geometry of the parabola, 2 atan(D/4f).
 *
 * @example
 * degrees(rimAngleRad(dish(5, 0.6036))) // 45.00
 */
export function rimAngleRad(dish: Pick<DishSettings, 'focalRatio'>): number {
  return 2 * Math.atan(1 / (4 * dish.focalRatio));
}

/**
 * Distance from the vertex to the focus.
 *
 * @returns focal length [m]
 *
 * @example
 * focalLengthM(dish(5, 0.6)) // 3
 */
export function focalLengthM(dish: Pick<DishSettings, 'focalRatio' | 'apertureDiameterM'>): number {
  return dish.focalRatio * dish.apertureDiameterM;
}

/**
 * Gross aperture, the denominator of every efficiency: nothing is taken off for receiver or struts.
 *
 * @returns area [m²]
 *
 * Source: πD²/4.
 *
 * @example
 * apertureAreaM2(dish(5, 0.6)) // 19.635
 */
export function apertureAreaM2(dish: Pick<DishSettings, 'apertureDiameterM'>): number {
  return (Math.PI * dish.apertureDiameterM ** 2) / 4;
}

/**
 * Geometric concentration: gross aperture over receiver aperture.
 *
 * @param dish - the dish
 * @param receiverAreaM2 - area of the receiver's aperture [m², > 0]
 * @returns concentration ratio
 * @throws DomainError for a receiver without area
 *
 * @example
 * geometricConcentration(dish(5, 0.6), 0.0784) // 250.4
 */
export function geometricConcentration(
  dish: Pick<DishSettings, 'apertureDiameterM'>,
  receiverAreaM2: number,
): number {
  requireRange('receiver area [m²]', receiverAreaM2, Number.MIN_VALUE, Number.MAX_VALUE);
  return apertureAreaM2(dish) / receiverAreaM2;
}

/** Beyond this the small-angle sums of squares no longer describe a mirror [rad]. */
const MAX_ERROR_RAD = 0.1;
