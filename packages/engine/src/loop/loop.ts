export interface PipeSettings {
  /** Exposed pipe one way [m]. */
  readonly lengthM: number;
  readonly boreM: number;
  readonly wallM: number;
  readonly insulationM: number;
  readonly insulationConductivityWmK: number;
  readonly outsideFilmWm2K: number;
}

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
