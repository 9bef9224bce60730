/** What the dish must know of a receiver to bring light into it. */
export interface ReceiverOptics {
  /** Opening that takes up the light: the face itself or the entry in front of it [m²]. */
  readonly openingAreaM2: number;
  /** Share of the reflected light that falls into the opening [1]. */
  readonly interceptFactor: number;
  /** Share of the light at the opening that reaches the face [1]. */
  readonly secondaryTransmittance: number;
  /** Share of the light on the face that is absorbed [1]. */
  readonly absorptance: number;
}

/** Conditions of one step, and what the receiver does under them. One object is reused for all steps. */
export interface ReceiverStep {
  /** Light on the face [W], of which `absorbedW` is absorbed. */
  incidentW: number;
  absorbedW: number;
  dtS: number;
  /** Water through the receiver [kg/s]; 0 while the pump stands. */
  flowKgS: number;
  inletC: number;
  airC: number;
  /** Wind as in the weather file [m/s]. */
  windMs: number;
  pressurePa: number;
  /** How far the face looks down from the horizontal [rad]: 0 upright, π/2 straight down. */
  tiltDownRad: number;

  /** Results. Temperatures are those at the end of the step, powers are means over it. */
  outletC: number;
  heatToFluidW: number;
  powerDcW: number;
  convectionW: number;
  radiationW: number;
  backLossW: number;
  /** Heat kept in the receiver [W]; negative while it cools. */
  storedW: number;
  faceC: number;
  /** Hottest cell, or the face where there are no cells [°C]. */
  hottestC: number;
}

export function createReceiverStep(): ReceiverStep {
  return {
    incidentW: 0,
    absorbedW: 0,
    dtS: 0,
    flowKgS: 0,
    inletC: 0,
    airC: 0,
    windMs: 0,
    pressurePa: 0,
    tiltDownRad: 0,
    outletC: 0,
    heatToFluidW: 0,
    powerDcW: 0,
    convectionW: 0,
    radiationW: 0,
    backLossW: 0,
    storedW: 0,
    faceC: 0,
    hottestC: 0,
  };
}

/**
 * A receiver through time. `solve` tries a step without changing the receiver, `commit` takes the last
 * solution as the new state: the pump's control tries several flows before one is kept.
 */
export interface Receiver {
  readonly optics: ReceiverOptics;
  /** Cells must be cooled whenever they are lit; a coil may run dry until it is worth pumping. */
  readonly coolWhenLit: boolean;
  /** Whether `hottestC` is of cells. */
  readonly hasCells: boolean;
  /**
   * Balance at the end of the step: absorbed = losses + electricity + heat to the water + heat kept, solved
   * implicitly in the face's temperature to 1e-11 of the absorbed power.
   *
   * @throws ConvergenceError when no balance is found
   */
  solve(step: ReceiverStep): void;
  commit(step: ReceiverStep): void;
  /** Whether the solved step passes a temperature limit of the receiver. */
  overLimit(step: ReceiverStep): boolean;
  /** Electric behaviour behind the receiver, or null where it makes no power. */
  readonly inverter: { readonly ratingW: number; lossW(dcW: number): number } | null;
}
