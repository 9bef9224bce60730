import { requireRange } from '../errors.js';
import {
  waterDensityKgM3,
  waterEnthalpyJkg,
  waterTemperatureC,
  waterTemperatureNearC,
} from '../water/water.js';
import { mixInversions } from './mix-inversions.js';
import type { TankFluid, TankSettings, TankStep } from './settings.js';

export { createTankStep } from './settings.js';
export type {
  ChargeInlet,
  DrawPolicy,
  TankFluid,
  TankSettings,
  TankStep,
  TankSurroundings,
} from './settings.js';

/** Most layers a tank may have. */
export const MAX_TANK_LAYERS = 40;

/**
 * Largest part of a layer's water or heat that one inner step may exchange. At this limit halving the inner
 * step moves no layer by more than 0.05 K (a property test holds it for 1–40 layers and random flows).
 */
const EXCHANGE_LIMIT = 0.1;

const WATER: TankFluid = {
  densityKgM3: waterDensityKgM3,
  enthalpyJkg: waterEnthalpyJkg,
  temperatureC: waterTemperatureC,
  temperatureNearC: waterTemperatureNearC,
};

/** What a check may set; a run leaves it out. */
export interface TankOptions {
  /** The liquid inside; water by default. */
  readonly fluid?: TankFluid;
  /** How often the inner step is halved [0, 1, 2 …], to see how little it matters; 0 by default. */
  readonly halvings?: number;
}

/** A store of stratified water. Layers are counted from the bottom. */
export interface Tank {
  /** Moves the tank on by one step: reads the conditions in io and writes its results there. */
  step(io: TankStep): void;
  /** Heat stored above 0 °C [J]. */
  energyJ(): number;
  /** Writes each layer's temperature [°C], bottom first. */
  temperaturesC(out: Float64Array): void;
  readonly layers: number;
  /** Mass of the water [kg]. */
  readonly massKg: number;
  /** Temperature of the top layer [°C]. */
  readonly topC: number;
  /** Temperature of the bottom layer [°C]. */
  readonly bottomC: number;
  /** Specific enthalpy of the bottom layer [J/kg], where the loop takes its water. */
  readonly bottomEnthalpyJkg: number;
}

/**
 * A tank of layers of equal mass, each fully mixed, at one temperature throughout.
 *
 * The mass is the volume × the density at the temperature of filling and stays so (expansion goes to a vessel).
 * Between neighbours the net of draw (upwards) and charge (downwards from its inlet) carries the enthalpy of the
 * layer it comes from; heat is conducted between layers and lost through the shell. Each engine step is cut into
 * equal inner steps of a third-order strong-stability-preserving Runge–Kutta method; layers that lie under colder
 * ones are merged after each stage, so that a rising plume is mixed into all it passes at the same order of
 * accuracy. What crosses the boundary is summed with the method's own weights: the change of `energyJ` is
 * heatInJ − heatDrawnJ − shellLossJ to round-off in every step.
 *
 * @param settings size, losses and inlet **[ranges: see {@link TankSettings}]**
 * @param initialC temperature at the start **[°C, 0…200]**
 * @throws DomainError for a setting or a start out of its range
 *
 * Source: multi-node tank of Duffie & Beckman, Solar Engineering of Thermal Processes, ch. 8 (value from memory);
 * the integration method is that of Shu & Osher 1988, J. Comput. Phys. 77:439.
 */
export function createTank(settings: TankSettings, initialC: number, options: TankOptions = {}): Tank {
  requireRange('tank.volumeM3', settings.volumeM3, 1e-3, 1e5);
  requireRange('tank.heightM', settings.heightM, 1e-2, 100);
  requireRange('tank.lossUaWK', settings.lossUaWK, 0, 1e5);
  requireRange('tank.effectiveConductivityWmK', settings.effectiveConductivityWmK, 0, 1e3);
  requireRange('tank.layers', Number.isInteger(settings.layers) ? settings.layers : NaN, 1, MAX_TANK_LAYERS);
  requireRange('tank initial temperature [°C]', initialC, 0, 200);
  if (settings.chargeInlet.kind === 'fixedHeight') {
    requireRange('tank.chargeInlet.heightFraction', settings.chargeInlet.heightFraction, 0, 1);
  }
  if (settings.surroundings.kind === 'plantRoom') {
    requireRange('tank.surroundings.temperatureC', settings.surroundings.temperatureC, -100, 100);
  }
  return new LayeredTank(
    settings,
    initialC,
    options.fluid ?? WATER,
    EXCHANGE_LIMIT / 2 ** (options.halvings ?? 0),
  );
}

class LayeredTank implements Tank {
  readonly layers: number;
  readonly massKg: number;
  readonly #layerKg: number;
  /** Conductance between neighbours [W/K]. */
  readonly #conductionWK: number;
  /** Loss of an inner layer, and what top and bottom lose besides [W/K]. */
  readonly #sideWK: number;
  readonly #endWK: number;
  /** Highest rate at which a resting layer exchanges heat [1/s]. */
  readonly #restingRate: number;
  readonly #roomC: number;
  /** Layer of a fixed inlet, or −1: the matching layer. */
  readonly #fixedInlet: number;
  readonly #fluid: TankFluid;
  readonly #exchangeLimit: number;

  readonly #enthalpy: Float64Array;
  readonly #stage: Float64Array;
  readonly #rate: Float64Array;
  readonly #blockSum: Float64Array;
  readonly #blockCount: Int32Array;

  // Conditions of the step at hand, and its sums: fields, so that no stage allocates.
  #chargeKgS = 0;
  #riseJkg = 0;
  /** Layer the charge enters, and the share of it that enters the layer above. */
  #inlet = 0;
  #shareAbove = 0;
  #surroundingsC = 0;
  #loadKgS = 0;
  #setJkg = 0;
  #mainsJkg = 0;
  #drawnJ = 0;
  #lossJ = 0;
  #shortJ = 0;
  #drawnKg = 0;

  constructor(settings: TankSettings, initialC: number, fluid: TankFluid, exchangeLimit: number) {
    const { layers, volumeM3, heightM, lossUaWK, effectiveConductivityWmK } = settings;
    this.layers = layers;
    this.massKg = volumeM3 * fluid.densityKgM3(initialC);
    this.#layerKg = this.massKg / layers;
    const crossSectionM2 = volumeM3 / heightM;
    this.#conductionWK = layers > 1 ? (effectiveConductivityWmK * crossSectionM2 * layers) / heightM : 0;
    const sideM2 = 2 * Math.sqrt(Math.PI * crossSectionM2) * heightM;
    const perM2 = lossUaWK / (sideM2 + 2 * crossSectionM2);
    this.#sideWK = (perM2 * sideM2) / layers;
    this.#endWK = perM2 * crossSectionM2;
    const heatCapacityJkgK = fluid.enthalpyJkg(initialC + 1) - fluid.enthalpyJkg(initialC);
    this.#restingRate =
      (2 * this.#conductionWK + this.#sideWK + 2 * this.#endWK) / (this.#layerKg * heatCapacityJkgK);
    this.#roomC =
      settings.surroundings.kind === 'plantRoom' ? settings.surroundings.temperatureC : Number.NaN;
    this.#fixedInlet =
      settings.chargeInlet.kind === 'fixedHeight'
        ? Math.min(layers - 1, Math.floor(settings.chargeInlet.heightFraction * layers))
        : -1;
    this.#fluid = fluid;
    this.#exchangeLimit = exchangeLimit;
    this.#enthalpy = new Float64Array(layers).fill(fluid.enthalpyJkg(initialC));
    this.#stage = new Float64Array(layers);
    this.#rate = new Float64Array(layers);
    this.#blockSum = new Float64Array(layers);
    this.#blockCount = new Int32Array(layers);
  }

  get topC(): number {
    return this.#fluid.temperatureC(this.#enthalpy[this.layers - 1]!);
  }

  get bottomC(): number {
    return this.#fluid.temperatureC(this.#enthalpy[0]!);
  }

  get bottomEnthalpyJkg(): number {
    return this.#enthalpy[0]!;
  }

  energyJ(): number {
    let sum = 0;
    for (let i = 0; i < this.layers; i++) sum += this.#enthalpy[i]!;
    return sum * this.#layerKg;
  }

  temperaturesC(out: Float64Array): void {
    for (let i = 0; i < this.layers; i++) out[i] = this.#fluid.temperatureC(this.#enthalpy[i]!);
  }

  step(io: TankStep): void {
    this.#readConditions(io);
    const flowRate = Math.max(this.#chargeKgS, this.#loadKgS) / this.#layerKg;
    const inner = Math.max(1, Math.ceil((io.dtS * (flowRate + this.#restingRate)) / this.#exchangeLimit));
    const dtS = io.dtS / inner;
    for (let i = 0; i < inner; i++) this.#innerStep(dtS);

    io.heatInJ = this.#chargeKgS * this.#riseJkg * io.dtS;
    io.heatDrawnJ = this.#drawnJ;
    io.shellLossJ = this.#lossJ;
    io.loadNeedJ = this.#loadKgS * Math.max(0, this.#setJkg - this.#mainsJkg) * io.dtS;
    io.shortfallJ = this.#shortJ;
    io.drawnKg = this.#drawnKg;
  }

  #readConditions(io: TankStep): void {
    requireRange('tank step [s]', io.dtS, 1e-6, 1e6);
    requireRange('charge flow [kg/s]', io.chargeFlowKgS, 0, 1e4);
    this.#chargeKgS = io.chargeFlowKgS;
    this.#riseJkg = 0;
    if (io.chargeFlowKgS > 0) {
      requireRange('charge enthalpy rise [J/kg]', io.chargeEnthalpyRiseJkg, -1e6, 1e6);
      this.#riseJkg = io.chargeEnthalpyRiseJkg;
    }
    this.#surroundingsC = Number.isNaN(this.#roomC) ? io.surroundingsC : this.#roomC;
    requireRange('tank surroundings [°C]', this.#surroundingsC, -100, 100);
    if (this.#fixedInlet >= 0) this.#inlet = this.#fixedInlet;
    else this.#matchInlet();
    this.#loadKgS = 0;
    if (io.draw !== null && io.draw.loadFlowKgS !== 0) {
      requireRange('load flow [kg/s]', io.draw.loadFlowKgS, 0, 1e4);
      requireRange('load set point [°C]', io.draw.setPointC, 0, 200);
      requireRange('mains temperature [°C]', io.draw.mainsC, 0, 100);
      this.#loadKgS = io.draw.loadFlowKgS;
      this.#setJkg = this.#fluid.enthalpyJkg(io.draw.setPointC);
      this.#mainsJkg = this.#fluid.enthalpyJkg(io.draw.mainsC);
    }
    this.#drawnJ = 0;
    this.#lossJ = 0;
    this.#shortJ = 0;
    this.#drawnKg = 0;
  }

  /**
   * The two neighbours between which the charged stream belongs at the start of the step, and how it is shared so
   * that the shares' mean is its own enthalpy. A whole layer at a time would make the inlet jump, and with it the
   * layers, at the least change of the stream.
   */
  #matchInlet(): void {
    const u = this.#enthalpy;
    const stream = u[0]! + this.#riseJkg;
    let layer = this.layers - 1;
    while (layer > 0 && u[layer]! > stream) layer--;
    this.#inlet = layer;
    const below = u[layer]!;
    this.#shareAbove =
      layer < this.layers - 1 && stream > below ? (stream - below) / (u[layer + 1]! - below) : 0;
  }

  /** Three Euler stages u₁, u₂, u₃ combined by Shu & Osher; their rates count 1/6, 1/6 and 2/3. */
  #innerStep(dtS: number): void {
    const u = this.#enthalpy;
    const stage = this.#stage;
    const rate = this.#rate;
    const n = this.layers;

    this.#rates(u, dtS / 6);
    for (let i = 0; i < n; i++) stage[i] = u[i]! + dtS * rate[i]!;
    mixInversions(stage, this.#blockSum, this.#blockCount);

    this.#rates(stage, dtS / 6);
    for (let i = 0; i < n; i++) stage[i] = 0.75 * u[i]! + 0.25 * (stage[i]! + dtS * rate[i]!);
    mixInversions(stage, this.#blockSum, this.#blockCount);

    this.#rates(stage, (2 * dtS) / 3);
    for (let i = 0; i < n; i++) u[i] = u[i]! / 3 + (2 / 3) * (stage[i]! + dtS * rate[i]!);
    mixInversions(u, this.#blockSum, this.#blockCount);
  }

  /** Writes each layer's rate of change [J/(kg·s)] and adds what crosses the boundary in weightS seconds. */
  #rates(u: Float64Array, weightS: number): void {
    const n = this.layers;
    const top = n - 1;
    const rate = this.#rate;
    const through = this.#loadKgS > 0 ? this.#draw(u[top]!, weightS) : 0;
    const charge = this.#chargeKgS;
    const inlet = this.#inlet;
    const chargeAbove = charge * this.#shareAbove;
    const perKg = 1 / this.#layerKg;
    const conductionWK = this.#conductionWK;
    const sideWK = this.#sideWK;
    const surroundingsC = this.#surroundingsC;
    const fluid = this.#fluid;

    let tC = fluid.temperatureNearC(u[0]!);
    let lossW = this.#endWK * (tC - surroundingsC);
    // Power into the layer at hand from below and from outside [W].
    let inW = through * this.#mainsJkg - charge * u[0]! - lossW;
    for (let i = 0; i < top; i++) {
      const net = i < inlet ? through - charge : i === inlet ? through - chargeAbove : through;
      const aboveC = fluid.temperatureNearC(u[i + 1]!);
      const upW = (net > 0 ? net * u[i]! : net * u[i + 1]!) + conductionWK * (tC - aboveC);
      const sideW = sideWK * (tC - surroundingsC);
      lossW += sideW;
      rate[i] = (inW - sideW - upW) * perKg;
      inW = upW;
      tC = aboveC;
    }
    const topW = (sideWK + this.#endWK) * (tC - surroundingsC);
    lossW += topW;
    rate[top] = (inW - topW - through * u[top]!) * perKg;
    const stream = (u[0]! + this.#riseJkg) * perKg;
    rate[inlet]! += (charge - chargeAbove) * stream;
    if (chargeAbove > 0) rate[inlet + 1]! += chargeAbove * stream;
    this.#lossJ += lossW * weightS;
  }

  /** Flow that the mixing valve takes through the tank [kg/s]; adds the draw's sums over weightS seconds. */
  #draw(topJkg: number, weightS: number): number {
    const warmth = topJkg - this.#mainsJkg;
    const need = this.#setJkg - this.#mainsJkg;
    if (need <= 0) return 0;
    const through = warmth > need ? (this.#loadKgS * need) / warmth : this.#loadKgS;
    this.#drawnJ += through * warmth * weightS;
    this.#drawnKg += through * weightS;
    if (warmth < need) this.#shortJ += this.#loadKgS * (need - warmth) * weightS;
    return through;
  }
}
