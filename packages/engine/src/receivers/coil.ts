import { requireRange } from '../errors.js';
import { solveIncreasing, type IncreasingProblem } from '../numeric/solve-increasing.js';
import type { DishSettings } from '../optics/dish.js';
import { squareIntercept } from '../optics/intercept.js';
import {
  HIGHEST_C,
  LOWEST_C,
  balanceToleranceW,
  faceLossSlopeWK,
  frontLossesW,
  backLossW,
  heatToWaterSlopeWK,
  heatToWaterW,
  requireFace,
} from './face.js';
import type { Receiver, ReceiverOptics, ReceiverStep } from './receiver.js';
import type { CoilReceiverSettings } from './settings.js';

/**
 * A coil behind a flat absorbing face: heat only. One lumped temperature, implicit in time.
 *
 * The conductance from face to water decides the face's temperature and with it the losses: a poor joint lets
 * the face glow.
 */
export class CoilReceiver implements Receiver, IncreasingProblem {
  readonly optics: ReceiverOptics;
  readonly coolWhenLit = false;
  readonly hasCells = false;
  readonly inverter = null;
  private faceC: number;
  private step: ReceiverStep | null = null;

  constructor(
    private readonly settings: CoilReceiverSettings,
    dish: DishSettings,
    initialC: number,
  ) {
    requireFace(settings.face);
    requireRange('face to water [W/K]', settings.coilUaWK, 1e-3, 1e6);
    this.faceC = initialC;
    this.optics = {
      openingAreaM2: settings.face.sideM ** 2,
      interceptFactor: squareIntercept(dish, settings.face.sideM),
      secondaryTransmittance: 1,
      absorptance: settings.face.absorptance,
    };
  }

  solve(step: ReceiverStep): void {
    this.step = step;
    const { face, coilUaWK } = this.settings;
    const slope =
      face.heatCapacityJK / step.dtS + faceLossSlopeWK(face, this.faceC) + heatToWaterSlopeWK(step, coilUaWK);
    step.faceC = solveIncreasing(
      this,
      step.faceC,
      slope,
      LOWEST_C,
      HIGHEST_C,
      balanceToleranceW(step.absorbedW),
    );
    step.hottestC = step.faceC;
    step.powerDcW = 0;
  }

  residual(faceC: number): number {
    const { step } = this;
    if (!step) return NaN;
    const { face, coilUaWK } = this.settings;
    step.storedW = (face.heatCapacityJK * (faceC - this.faceC)) / step.dtS;
    const lossesW = frontLossesW(face, step, faceC) + backLossW(face, step, faceC);
    return step.storedW + lossesW + heatToWaterW(step, faceC, coilUaWK) - step.absorbedW;
  }

  commit(step: ReceiverStep): void {
    this.faceC = step.faceC;
  }

  overLimit(): boolean {
    return false;
  }
}
