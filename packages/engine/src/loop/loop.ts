import { requireRange } from '../errors.js';
import { solveIncreasing, type IncreasingProblem } from '../numeric/solve-increasing.js';
import type { Receiver, ReceiverStep } from '../receivers/receiver.js';
import { waterDensityKgM3, waterEnthalpyJkg } from '../water/water.js';
import type { PipeSettings } from './pipe-registry.js';
import type { PipeSurroundings } from './pipe-surroundings.js';
import { Pipe } from './pipe.js';

export interface LoopSettings {
  /** Temperature held where the water leaves the receiver [°C]. */
  readonly setPointC: number;
  /** Above this at full flow the store counts as full [°C]. */
  readonly outletLimitC: number;
  readonly minFlowKgS: number;
  readonly maxFlowKgS: number;
  readonly startDifferenceK: number;
  readonly stopDifferenceK: number;
  /** Of the whole loop at the greatest flow [Pa]. */
  readonly pressureDropPa: number;
  readonly pumpEfficiency: number;
  readonly pipe: PipeSettings;
}

/** How near the held outlet temperature comes to its set point [K]: far inside any sensor's error. */
const SET_POINT_TOLERANCE_K = 1e-4;

/**
 * The loop between tank and receiver: pipe out, receiver, pipe back, and the pump's control.
 *
 * The pump varies its flow between two limits to hold the receiver's outlet at the set point; it runs at the
 * lowest flow while the set point is out of reach and at the highest while it is passed. A coil's pump starts
 * when the face would stand hotter than the tank's bottom layer by the start difference, and stops when the
 * outlet is less than the stop difference above it. Lit cells are cooled always.
 */
export class Loop implements IncreasingProblem {
  readonly toReceiver: Pipe;
  readonly toTank: Pipe;
  private outsidePipesC: number;
  private running = false;
  private lastFlowKgS: number;
  private bottomC = 0;
  private bottomJkg = 0;

  /** Results of the last solved step. */
  flowKgS = 0;
  heatToStoreW = 0;
  /** What the stream gains on its way from the tank and back [J/kg]. */
  enthalpyRiseJkg = 0;
  pumpW = 0;

  constructor(
    private readonly settings: LoopSettings,
    private readonly receiver: Receiver,
    private readonly step: ReceiverStep,
    private readonly surroundings: PipeSurroundings,
    initialC: number,
  ) {
    requireRange('least flow [kg/s]', settings.minFlowKgS, 1e-6, settings.maxFlowKgS);
    requireRange('pump efficiency', settings.pumpEfficiency, 1e-3, 1);
    this.toReceiver = new Pipe(settings.pipe, surroundings, initialC);
    this.toTank = new Pipe(settings.pipe, surroundings, initialC);
    this.outsidePipesC = initialC;
    this.lastFlowKgS = settings.minFlowKgS;
  }

  /**
   * Takes the temperature around the pipes for the record whose weather stands in the receiver's step.
   * @param day - of the year at the middle of the record, from 1, with its fraction
   */
  beginRecord(day: number): void {
    this.outsidePipesC = this.surroundings.outsideC(this.step.airC, day);
  }

  /**
   * Solves the loop for the light and weather standing in the receiver's step. Nothing changes until `commit`,
   * so that the same step can be tried again without light.
   *
   * @param bottomC - temperature of the tank's bottom layer at the start of the step [°C]
   */
  solve(bottomC: number): void {
    this.bottomC = bottomC;
    this.bottomJkg = waterEnthalpyJkg(bottomC);
    const lit = this.step.absorbedW > 0;
    if (lit && this.receiver.coolWhenLit) {
      this.holdSetPoint();
    } else if (!lit && this.receiver.coolWhenLit) {
      this.outletAtC(0);
    } else if (this.running || this.worthStarting()) {
      this.holdSetPoint();
      if (this.step.outletC < bottomC + this.settings.stopDifferenceK) this.outletAtC(0);
    }
    // A receiver left hotter than the loop may get (after a stop in full sun) is not flooded while it cools.
    if (!lit && this.outletOverLimit) this.outletAtC(0);
    this.toTank.solve(this.flowKgS, waterEnthalpyJkg(this.step.outletC), this.outsidePipesC, this.step.dtS);
    this.enthalpyRiseJkg = this.flowKgS > 0 ? this.toTank.outletJkg - this.bottomJkg : 0;
    this.heatToStoreW = this.flowKgS * this.enthalpyRiseJkg;
    this.pumpW = this.pumpPowerW();
  }

  commit(): void {
    this.receiver.commit(this.step);
    this.toReceiver.commit();
    this.toTank.commit();
    this.running = this.flowKgS > 0;
    if (this.running) this.lastFlowKgS = this.flowKgS;
  }

  /** Whether full flow still leaves the receiver above the limit: the store cannot take the heat. */
  get outletOverLimit(): boolean {
    return this.flowKgS > 0 && this.step.outletC > this.settings.outletLimitC;
  }

  /** Set point minus outlet temperature at a flow: increasing, because more flow leaves cooler. */
  residual(flowKgS: number): number {
    return this.settings.setPointC - this.outletAtC(flowKgS);
  }

  private worthStarting(): boolean {
    this.outletAtC(0);
    return this.step.faceC > this.bottomC + this.settings.startDifferenceK;
  }

  private holdSetPoint(): void {
    const { minFlowKgS, maxFlowKgS, setPointC } = this.settings;
    if (this.outletAtC(minFlowKgS) <= setPointC) return;
    if (this.outletAtC(maxFlowKgS) >= setPointC) return;
    const guess = this.lastFlowKgS;
    const slope = Math.max(1, Math.abs(setPointC - this.bottomC)) / guess;
    solveIncreasing(this, guess, slope, minFlowKgS, maxFlowKgS, SET_POINT_TOLERANCE_K);
  }

  private outletAtC(flowKgS: number): number {
    this.flowKgS = flowKgS;
    this.toReceiver.solve(flowKgS, this.bottomJkg, this.outsidePipesC, this.step.dtS);
    this.step.flowKgS = flowKgS;
    this.step.inletC = this.toReceiver.outletC;
    this.receiver.solve(this.step);
    return this.step.outletC;
  }

  /**
   * Electric power of the pump [W]: ṁ Δp/(ρ η), with the pressure drop falling with the square of the flow.
   * Source: hydraulic power; the square law stands for turbulent flow.
   */
  private pumpPowerW(): number {
    if (this.flowKgS <= 0) return 0;
    const { maxFlowKgS, pressureDropPa, pumpEfficiency } = this.settings;
    const dropPa = pressureDropPa * (this.flowKgS / maxFlowKgS) ** 2;
    return (this.flowKgS * dropPa) / (waterDensityKgM3(this.bottomC) * pumpEfficiency);
  }
}
