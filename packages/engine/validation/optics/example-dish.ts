import type { DishSettings } from '../../src/optics/dish.js';

/** A dish with the beam errors of the checks; only what the case is about is named. */
export function dish(apertureDiameterM: number, focalRatio: number, slopeErrorRad = 0.005): DishSettings {
  return {
    apertureDiameterM,
    focalRatio,
    slopeErrorRad,
    sunWidthRad: 0.00273,
    specularErrorRad: 0.001,
    trackingErrorRad: 0.002,
    reflectance: 0.9,
    cleanliness: 0.95,
    shadowFraction: 0.04,
  };
}
