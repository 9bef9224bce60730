/** What a kind of pipe loses its heat to. */
export interface PipeSurroundings {
  /** Conductance from the water to the surroundings, for each metre of pipe [W/(m·K)]. */
  readonly conductanceWmK: number;
  /**
   * Temperature of the surroundings [°C].
   * @param airC air of the weather record [°C]
   * @param day of the year at the middle of the record, from 1, with its fraction
   */
  outsideC(airC: number, day: number): number;
}

/** Sizes that every pipe has, whatever stands around it. */
export interface PipeSizes {
  /** One way [m]. */
  readonly lengthM: number;
  readonly boreM: number;
  readonly wallM: number;
  readonly insulationM: number;
  readonly insulationConductivityWmK: number;
}
