/** What a stratified tank is: its size, its losses, and where the charged water enters. */
export interface TankSettings {
  /** Volume of water when filled [m³, > 0]. */
  readonly volumeM3: number;
  /** Layers of equal mass, each fully mixed [1…40]. */
  readonly layers: number;
  /** Height of the water [m, > 0]; with the volume it gives the cross-section. */
  readonly heightM: number;
  /** Heat loss of the whole shell [W/K, ≥ 0], shared by the layers as the outer surface of a cylinder. */
  readonly lossUaWK: number;
  readonly surroundings: TankSurroundings;
  /** Vertical conduction of water and wall with a term for mixing by jets and currents [W/(m·K), ≥ 0]. */
  readonly effectiveConductivityWmK: number;
  readonly chargeInlet: ChargeInlet;
}

/** What surrounds the tank: a room of constant temperature [°C], or the outdoor air given with each step. */
export type TankSurroundings =
  { readonly kind: 'plantRoom'; readonly temperatureC: number } | { readonly kind: 'outdoors' };

/**
 * Where the charged water enters: at a fixed height (0 bottom … 1 top), or at the matching layer as an inlet
 * stratifier does: shared by the two neighbours it belongs between, the nearer in warmth getting more.
 */
export type ChargeInlet =
  { readonly kind: 'fixedHeight'; readonly heightFraction: number } | { readonly kind: 'matchingLayer' };

/**
 * Water drawn for a load through a mixing valve: of the load's flow, just so much goes through the tank (mains
 * water in at the bottom, the top layer's water out) that the mixture meets the set point; the rest is mains
 * water mixed in after it. As long as the mixture is too cold the valve sends all of it through the tank, also
 * through one colder than the mains, which then takes heat from the load's water. A set point at or below
 * mains temperature draws nothing.
 */
export interface DrawPolicy {
  /** Flow at the load [kg/s, ≥ 0]. */
  loadFlowKgS: number;
  /** Temperature the load asks for [°C]. */
  setPointC: number;
  /** Temperature of the make-up water [°C]. */
  mainsC: number;
}

/** One step's conditions, read by `step`, and its results, written by it. One object serves a whole year. */
export interface TankStep {
  /** Length of the step [s, > 0]. */
  dtS: number;
  /** Flow from the bottom layer through the loop to the inlet [kg/s, ≥ 0]. */
  chargeFlowKgS: number;
  /** What the loop adds to that water [J/kg]; below 0 where the loop cools it. */
  chargeEnthalpyRiseJkg: number;
  /** Temperature around a tank that stands outdoors [°C]; a plant room's own temperature goes before it. */
  surroundingsC: number;
  draw: DrawPolicy | null;
  /** Heat brought by the loop: flow × rise × time [J]. */
  heatInJ: number;
  /** Heat taken out by the draw, above mains temperature [J]; below 0 from a tank colder than the mains. */
  heatDrawnJ: number;
  /** Heat lost through the shell [J]; below 0 where the surroundings are warmer. */
  shellLossJ: number;
  /** Heat the load needs: flow × (set point − mains) [J]. */
  loadNeedJ: number;
  /** What the mixture is short of the set point [J]; the load's need is this plus what was drawn. */
  shortfallJ: number;
  /** Water that went through the tank to the load [kg]. */
  drawnKg: number;
}

/** A step with nothing set: all conditions and results 0, no draw. */
export function createTankStep(): TankStep {
  return {
    dtS: 0,
    chargeFlowKgS: 0,
    chargeEnthalpyRiseJkg: 0,
    surroundingsC: 0,
    draw: null,
    heatInJ: 0,
    heatDrawnJ: 0,
    shellLossJ: 0,
    loadNeedJ: 0,
    shortfallJ: 0,
    drawnKg: 0,
  };
}

/** A liquid whose properties depend on temperature only; water unless a check brings another. */
export interface TankFluid {
  /** Density at a temperature [°C → kg/m³]. */
  densityKgM3(tC: number): number;
  /** Enthalpy above 0 °C, growing with temperature [°C → J/kg]. */
  enthalpyJkg(tC: number): number;
  /** Exact inverse of enthalpyJkg [J/kg → °C]. */
  temperatureC(enthalpyJkg: number): number;
  /** Inverse of enthalpyJkg good to 1e-3 K [J/kg → °C], for losses and conduction. */
  temperatureNearC(enthalpyJkg: number): number;
}
