import { requireRange } from '../errors.js';
import { solveIncreasing, type IncreasingProblem } from '../numeric/solve-increasing.js';
import type { DishSettings } from '../optics/dish.js';
import { squareIntercept } from '../optics/intercept.js';
import { CellArray } from './cell-array.js';
import {
  HIGHEST_C,
  LOWEST_C,
  balanceToleranceW,
  faceLossSlopeWK,
  faceLossesW,
  heatToWaterSlopeWK,
  heatToWaterW,
  requireFace,
} from './face.js';
import { Inverter } from './inverter.js';
import type { Receiver, ReceiverOptics, ReceiverStep } from './receiver.js';
import type { CellReceiverSettings } from './settings.js';

/**
 * A dense array of cells on a cooled plate: heat and power. One lumped plate temperature, implicit in time;
 * the cells ride above it by flux × area resistance. What is absorbed and not converted is heat for the loop.
 */
export class CellReceiver implements Receiver, IncreasingProblem {
  readonly optics: ReceiverOptics;
  readonly coolWhenLit = true;
  readonly hasCells = true;
  readonly inverter: Inverter;
  readonly array: CellArray;
  private plateC: number;
  private step: ReceiverStep | null = null;

  constructor(
    private readonly settings: CellReceiverSettings,
    dish: DishSettings,
    initialC: number,
  ) {
    const { face, secondary } = settings;
    requireFace(face);
    requireRange('plate to coolant [W/K]', settings.plateUaWK, 1e-3, 1e6);
    this.plateC = initialC;
    this.array = new CellArray(settings, dish);
    this.inverter = new Inverter(settings.inverter);
    const openingSideM = secondary.kind === 'mixingDuct' ? secondary.entrySideM : face.sideM;
    this.optics = {
      openingAreaM2: openingSideM ** 2,
      interceptFactor: squareIntercept(dish, openingSideM),
      secondaryTransmittance: secondary.kind === 'mixingDuct' ? secondary.transmittance : 1,
      absorptance: face.absorptance,
    };
  }

  /** `faceC` of the step is the plate's temperature while solving and the mean of the cells afterwards. */
  solve(step: ReceiverStep): void {
    this.step = step;
    const { face, plateUaWK } = this.settings;
    const guessC = this.plateGuessC(step);
    const slope =
      face.heatCapacityJK / step.dtS + faceLossSlopeWK(face, guessC) + heatToWaterSlopeWK(step, plateUaWK);
    this.solvedPlateC = solveIncreasing(
      this,
      guessC,
      slope,
      LOWEST_C,
      HIGHEST_C,
      balanceToleranceW(step.absorbedW),
    );
    step.faceC = this.array.meanC(step.incidentW, this.solvedPlateC);
    step.hottestC = this.array.hottestC(step.incidentW, this.solvedPlateC);
  }

  private solvedPlateC = 20;

  private plateGuessC(step: ReceiverStep): number {
    return step.flowKgS > 0 ? this.solvedPlateC : this.plateC;
  }

  residual(plateC: number): number {
    const { step } = this;
    if (!step) return NaN;
    const { face, plateUaWK } = this.settings;
    step.storedW = (face.heatCapacityJK * (plateC - this.plateC)) / step.dtS;
    // An array cannot make more than it absorbs, whatever its fields claim; the inverter holds it back above its rating.
    step.powerDcW = Math.min(
      this.array.powerW(step.incidentW, plateC),
      this.inverter.greatestDcW,
      step.absorbedW,
    );
    const losses = faceLossesW(face, step, this.array.meanC(step.incidentW, plateC));
    return step.storedW + losses + step.powerDcW + heatToWaterW(step, plateC, plateUaWK) - step.absorbedW;
  }

  commit(): void {
    this.plateC = this.solvedPlateC;
  }

  overLimit(step: ReceiverStep): boolean {
    return step.absorbedW > 0 && step.hottestC > this.settings.cell.temperatureLimitC;
  }
}
