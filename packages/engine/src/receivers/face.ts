import { STEFAN_BOLTZMANN, ZERO_CELSIUS_K } from '../constants.js';
import { requireRange } from '../errors.js';
import { flatFaceConvectionWm2K } from '../heat-transfer/flat-face-losses.js';
import { netRadiationWm2 } from '../heat-transfer/radiation.js';
import { waterEnthalpyJkg, waterHeatCapacityJkgK } from '../water/water.js';
import type { ReceiverStep } from './receiver.js';
import type { FaceSettings } from './settings.js';

/** Refuses a face that cannot be, naming the quantity. */
export function requireFace(face: FaceSettings): void {
  requireRange('face side [m]', face.sideM, 1e-3, 100);
  requireRange('absorptance', face.absorptance, 0, 1);
  requireRange('emittance', face.emittance, 0, 1);
  requireRange('back loss [W/K]', face.backLossWK, 0, 1e6);
  requireRange('receiver heat capacity [J/K]', face.heatCapacityJK, 1, 1e9);
  requireRange('wind height factor', face.windHeightFactor, 0, 10);
}

/**
 * Writes the losses of the front of a flat square face at `faceC` into the step and returns their sum [W].
 *
 * Convection and wind by `flatFaceConvectionWm2K`; radiation εσ(T⁴ − T_air⁴), because a receiver looks at its
 * own mirror, which is at air temperature.
 */
export function frontLossesW(face: FaceSettings, step: ReceiverStep, faceC: number): number {
  const areaM2 = face.sideM * face.sideM;
  const windMs = step.windMs * face.windHeightFactor;
  const film = flatFaceConvectionWm2K(
    faceC,
    step.airC,
    windMs,
    step.tiltDownRad,
    face.sideM,
    step.pressurePa,
  );
  step.convectionW = film * areaM2 * (faceC - step.airC);
  step.radiationW = areaM2 * netRadiationWm2(face.emittance, faceC, step.airC);
  return step.convectionW + step.radiationW;
}

/** Writes the loss through the back, which is at `backC`, into the step and returns it [W]. */
export function backLossW(face: FaceSettings, step: ReceiverStep, backC: number): number {
  step.backLossW = face.backLossWK * (backC - step.airC);
  return step.backLossW;
}

/** Slope of the losses with the face's temperature, close enough for a first step of the solver [W/K]. */
export function faceLossSlopeWK(face: FaceSettings, faceC: number): number {
  const areaM2 = face.sideM * face.sideM;
  const faceK = faceC + ZERO_CELSIUS_K;
  return face.backLossWK + areaM2 * (15 + 4 * face.emittance * STEFAN_BOLTZMANN * faceK * faceK * faceK);
}

/**
 * Heat from a surface at `surfaceC` to the water that passes it, written with the outlet temperature into the
 * step [W].
 *
 * Effectiveness 1 − exp(−UA/(ṁ c)) of a surface at one temperature, with c of the incoming water; the heat is
 * mass flow × enthalpy difference, so that it is the very energy that the loop carries on.
 *
 * Source: heat exchanger with one side at constant temperature, e.g. Incropera et al., Fundamentals of Heat
 * and Mass Transfer, ch. 11.
 */
export function heatToWaterW(step: ReceiverStep, surfaceC: number, uaWK: number): number {
  if (step.flowKgS <= 0) {
    step.outletC = step.inletC;
    step.heatToFluidW = 0;
    return 0;
  }
  const effectiveness = -Math.expm1(-uaWK / (step.flowKgS * waterHeatCapacityJkgK(step.inletC)));
  step.outletC = step.inletC + effectiveness * (surfaceC - step.inletC);
  step.heatToFluidW = step.flowKgS * (waterEnthalpyJkg(step.outletC) - waterEnthalpyJkg(step.inletC));
  return step.heatToFluidW;
}

/** Slope of that heat with the surface's temperature [W/K]. */
export function heatToWaterSlopeWK(step: ReceiverStep, uaWK: number): number {
  if (step.flowKgS <= 0) return 0;
  const capacityWK = step.flowKgS * waterHeatCapacityJkgK(step.inletC);
  return capacityWK * -Math.expm1(-uaWK / capacityWK);
}

/** Temperatures between which every balance of a receiver lies [°C]: absolute zero, and above the sun's. */
export const LOWEST_C = -ZERO_CELSIUS_K;
export const HIGHEST_C = 50_000;

/** Largest accepted residual of a receiver's balance [W]. */
export function balanceToleranceW(absorbedW: number): number {
  return 1e-11 * absorbedW + 1e-8;
}
