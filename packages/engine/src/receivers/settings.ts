/** What every receiver with a flat square face states. */
export interface FaceSettings {
  readonly sideM: number;
  /** Solar absorptance [1]. */
  readonly absorptance: number;
  /** Thermal emittance [1]. */
  readonly emittance: number;
  /** Conductance through the back to the air [W/K]. */
  readonly backLossWK: number;
  readonly heatCapacityJK: number;
  /** Wind at the receiver over wind in the file [1]. */
  readonly windHeightFactor: number;
}

export interface CoilReceiverSettings {
  readonly kind: 'coil';
  readonly face: FaceSettings;
  /** Face to water [W/K]. */
  readonly coilUaWK: number;
}

export type SecondarySettings =
  | { readonly kind: 'none' }
  | {
      readonly kind: 'mixingDuct';
      readonly entrySideM: number;
      readonly transmittance: number;
      /** Half spread of the local flux over its mean behind the duct [1]. */
      readonly unevenness: number;
    };

export interface CellReceiverSettings {
  readonly kind: 'cell';
  readonly face: FaceSettings;
  readonly secondary: SecondarySettings;
  readonly cell: {
    readonly referenceEfficiency: number;
    readonly referenceConcentration: number;
    readonly referenceTemperatureC: number;
    readonly seriesConcentration: number;
    /** Relative fall of efficiency per kelvin [1/K]. */
    readonly temperatureCoefficientPerK: number;
    readonly openCircuitVoltageV: number;
    readonly idealityFactor: number;
    readonly operatingVoltageV: number;
    readonly bypassVoltageV: number;
    readonly areaResistanceM2KW: number;
    readonly temperatureLimitC: number;
  };
  readonly grouping: 'bypassedString' | 'seriesString' | 'parallel';
  readonly cellsPerSide: number;
  readonly packingFraction: number;
  readonly plateUaWK: number;
  readonly inverter: {
    readonly ratingW: number;
    readonly efficiency: number;
    readonly standingLossFraction: number;
  };
}
