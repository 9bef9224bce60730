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
  frontLossesW,
  backLossW,
  heatToWaterSlopeWK,
  heatToWaterW,
  requireFace,
} from './face.js';
import { Inverter } from './inverter.js';
import type { Receiver, ReceiverOptics, ReceiverStep } from './receiver.js';
import type { CellReceiverSettings } from './settings.js';

/**
 * A dense array of cells on a cooled plate: heat and power. One lumped plate temperature, implicit in time.
 * What is absorbed and not converted is heat for the loop.
 *
 * The face that loses heat stands above the plate by the heat that passes the joint × its resistance. A cell's
 * own temperature, which decides its efficiency and the limit, is taken as plate + *light* × resistance: a
 * little high, on the safe side.
 */
export class CellReceiver implements Receiver, IncreasingProblem {
  readonly optics: ReceiverOptics;
  readonly coolWhenLit = true;
  readonly hasCells = true;
  readonly inverter: Inverter;
  readonly array: CellArray;
  /** Resistance between face and plate [K/W]. */
  private readonly jointKW: number;
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
    this.jointKW = settings.cell.areaResistanceM2KW / face.sideM ** 2;
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
    const throughJointW =
      step.storedW + backLossW(face, step, plateC) + heatToWaterW(step, plateC, plateUaWK);
    step.faceC = Math.max(LOWEST_C, plateC + throughJointW * this.jointKW);
    // An array cannot make more than it absorbs, whatever its fields claim; the inverter holds it back above its rating.
    step.powerDcW = Math.min(
      this.array.powerW(step.incidentW, plateC),
      this.inverter.greatestDcW,
      step.absorbedW,
    );
    return throughJointW + frontLossesW(face, step, step.faceC) + step.powerDcW - step.absorbedW;
  }

  commit(): void {
    this.plateC = this.solvedPlateC;
  }

  overLimit(step: ReceiverStep): boolean {
    return step.absorbedW > 0 && step.hottestC > this.settings.cell.temperatureLimitC;
  }
}
