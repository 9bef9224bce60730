import { STEFAN_BOLTZMANN, ZERO_CELSIUS_K } from '../constants.js';
import { requireRange } from '../errors.js';
import { netRadiationWm2 } from './radiation.js';

/** A face on sun with no flow behind it. */
export interface StagnationInput {
  /** Gross aperture over the area of the face [–, > 0]. */
  readonly concentration: number;
  /** Direct normal irradiance [W/m², ≥ 0]. */
  readonly dniWm2: number;
  /** Absorbed over the beam on the gross aperture [–, 0…1]. */
  readonly opticalEfficiency: number;
  /** Emittance of the face at the temperature it reaches [–, 0…1]. */
  readonly emittance: number;
  /** Convection and back losses per area of face [W/(m²·K), ≥ 0; not 0 together with the emittance]. */
  readonly lossWm2K: number;
  /** Temperature of air and surroundings [°C, −60…60]. */
  readonly ambientC: number;
}

/** Newton's method here gains digits from the first step on: a dozen steps suffice from any start. */
const MAX_ITERATIONS = 100;

/**
 * Temperature that a lit face reaches when the flow stops: where C·DNI·η = εσ(T⁴ − T_a⁴) + h (T − T_a).
 *
 * The loss is convex and grows with T, so that Newton's method from a start above the root comes down to it
 * without ever passing it. The start is the lower of what radiation alone and what the linear loss alone would give.
 *
 * @param input the face **[ranges: see {@link StagnationInput}]**
 * @returns **[°C]**, to 1e-9 K
 * @throws DomainError for a value out of its range
 *
 * Source: steady energy balance of an isothermal grey face.
 * @example
 * stagnationTemperatureC({concentration: 254, dniWm2: 900, opticalEfficiency: 0.81, emittance: 0.9, lossWm2K: 20, ambientC: 20}) // 1067
 */
export function stagnationTemperatureC(input: StagnationInput): number {
  const { concentration, dniWm2, opticalEfficiency, emittance, lossWm2K, ambientC } = input;
  requireRange('concentration', concentration, 0, 5e4);
  requireRange('direct normal irradiance [W/m²]', dniWm2, 0, 1500);
  requireRange('optical efficiency', opticalEfficiency, 0, 1);
  requireRange('emittance', emittance, 0, 1);
  requireRange('ambient temperature [°C]', ambientC, -100, 100);
  // A face that neither radiates nor convects has no such temperature.
  requireRange('loss of the face [W/(m²·K)]', lossWm2K, emittance > 0 ? 0 : 1e-6, 1e6);
  const absorbedWm2 = concentration * dniWm2 * opticalEfficiency;
  const ambientK = ambientC + ZERO_CELSIUS_K;
  const radiatedAlone = Math.sqrt(Math.sqrt(absorbedWm2 / (emittance * STEFAN_BOLTZMANN) + ambientK ** 4));
  const linearAlone = ambientK + absorbedWm2 / lossWm2K;
  // Either start is Infinity (or NaN with no light) where its loss is missing.
  let faceC = (absorbedWm2 === 0 ? ambientK : Math.min(radiatedAlone, linearAlone)) - ZERO_CELSIUS_K;
  for (let i = 0; i < MAX_ITERATIONS; i++) {
    const excess = netRadiationWm2(emittance, faceC, ambientC) + lossWm2K * (faceC - ambientC) - absorbedWm2;
    const slope = 4 * emittance * STEFAN_BOLTZMANN * (faceC + ZERO_CELSIUS_K) ** 3 + lossWm2K;
    const step = excess / slope;
    faceC -= step;
    if (Math.abs(step) <= 1e-10 * Math.max(1, Math.abs(faceC))) break;
  }
  return faceC;
}
