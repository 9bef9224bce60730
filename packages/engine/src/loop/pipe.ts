import { requireRange } from '../errors.js';
import { HIGHEST_C, LOWEST_C } from '../receivers/face.js';
import { solveIncreasing, type IncreasingProblem } from '../numeric/solve-increasing.js';
import { waterDensityKgM3, waterEnthalpyJkg, waterHeatCapacityJkgK } from '../water/water.js';
import type { PipeSizes, PipeSurroundings } from './pipe-surroundings.js';

/** Heat capacity of copper by volume [J/(m³·K)]: 8960 kg/m³ × 385 J/(kg·K). Source: CRC Handbook, value from memory. */
const COPPER_JM3K = 8960 * 385;

/** Water in the pipe is taken at this temperature for its mass [°C]. */
const FILLING_C = 20;

/** Largest accepted residual of a pipe's balance [W]. */
const TOLERANCE_W = 1e-9;

/**
 * One run of pipe, wall and water as one mixed node, implicit in time. What it holds at night it loses, and the
 * morning pays for it. Insulation and ground around it hold no heat here.
 */
export class Pipe implements IncreasingProblem {
  /** Conductance to what stands around it [W/K]. */
  readonly uaWK: number;
  private readonly waterKg: number;
  private readonly wallJK: number;
  private temperatureC: number;
  private solvedC: number;

  private flowKgS = 0;
  private inletJkg = 0;
  private outsideC = 0;
  private dtS = 1;
  private heldJ = 0;

  /** Results of the last solved step. */
  outletC = 0;
  outletJkg = 0;
  lossW = 0;
  storedW = 0;

  constructor(settings: PipeSizes, surroundings: PipeSurroundings, initialC: number) {
    requireRange('pipe length [m]', settings.lengthM, 0, 1e5);
    this.uaWK = settings.lengthM * surroundings.conductanceWmK;
    const boreAreaM2 = (Math.PI * settings.boreM ** 2) / 4;
    const wallAreaM2 = Math.PI * settings.wallM * (settings.boreM + settings.wallM);
    this.waterKg = waterDensityKgM3(FILLING_C) * boreAreaM2 * settings.lengthM;
    this.wallJK = COPPER_JM3K * wallAreaM2 * settings.lengthM;
    this.temperatureC = initialC;
    this.solvedC = initialC;
  }

  get nowC(): number {
    return this.temperatureC;
  }

  /** Tries one step with `flowKgS` of water entering at `inletJkg`; the pipe itself changes on `commit`. */
  solve(flowKgS: number, inletJkg: number, outsideC: number, dtS: number): void {
    this.flowKgS = flowKgS;
    this.inletJkg = inletJkg;
    this.outsideC = outsideC;
    this.dtS = dtS;
    this.heldJ = this.energyJ(this.temperatureC);
    const capacityJkgK = waterHeatCapacityJkgK(this.temperatureC);
    const slope = (this.waterKg * capacityJkgK + this.wallJK) / dtS + flowKgS * capacityJkgK + this.uaWK;
    this.solvedC = solveIncreasing(this, this.solvedC, slope, LOWEST_C, HIGHEST_C, TOLERANCE_W);
    this.outletC = this.solvedC;
  }

  residual(temperatureC: number): number {
    this.outletJkg = waterEnthalpyJkg(temperatureC);
    this.lossW = this.uaWK * (temperatureC - this.outsideC);
    this.storedW = (this.energyJ(temperatureC) - this.heldJ) / this.dtS;
    return this.storedW + this.lossW + this.flowKgS * (this.outletJkg - this.inletJkg);
  }

  commit(): void {
    this.temperatureC = this.solvedC;
  }

  private energyJ(temperatureC: number): number {
    return this.waterKg * waterEnthalpyJkg(temperatureC) + this.wallJK * temperatureC;
  }
}
