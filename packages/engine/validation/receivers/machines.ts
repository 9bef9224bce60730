import type { DishSettings } from '../../src/optics/dish.js';
import type { CellReceiverSettings, CoilReceiverSettings } from '../../src/receivers/settings.js';

/** The dish of the published checks: 15 ft, 4.572 m; common practice, no source. */
export const CHECK_DISH: DishSettings = {
  apertureDiameterM: 4.572,
  focalRatio: 2.743 / 4.572,
  slopeErrorRad: 0.005,
  sunWidthRad: 0.00273,
  specularErrorRad: 0.001,
  trackingErrorRad: 0.002,
  reflectance: 0.9,
  cleanliness: 0.95,
  shadowFraction: 0.04,
};

/** A dish of 5 m for checks that ask for none in particular. */
export const BENCH_DISH: DishSettings = { ...CHECK_DISH, apertureDiameterM: 5, focalRatio: 0.6 };

export const CHECK_COIL: CoilReceiverSettings = {
  kind: 'coil',
  face: {
    sideM: 0.254,
    absorptance: 0.92,
    emittance: 0.9,
    backLossWK: 0.3,
    heatCapacityJK: 6000,
    windHeightFactor: 0.84,
  },
  coilUaWK: 15,
};

export function cellSettings(change: Partial<CellReceiverSettings> = {}): CellReceiverSettings {
  return {
    kind: 'cell',
    face: {
      sideM: 0.28,
      absorptance: 0.92,
      emittance: 0.9,
      backLossWK: 0.3,
      heatCapacityJK: 6000,
      windHeightFactor: 0.84,
    },
    secondary: { kind: 'mixingDuct', entrySideM: 0.28, transmittance: 0.92, unevenness: 0.1 },
    cell: {
      referenceEfficiency: 0.39,
      referenceConcentration: 500,
      referenceTemperatureC: 25,
      seriesConcentration: 6000,
      temperatureCoefficientPerK: 0.0012,
      openCircuitVoltageV: 3.1,
      idealityFactor: 3.3,
      operatingVoltageV: 2.7,
      bypassVoltageV: 0.5,
      areaResistanceM2KW: 4e-5,
      temperatureLimitC: 110,
    },
    grouping: 'bypassedString',
    cellsPerSide: 14,
    packingFraction: 0.9,
    plateUaWK: 900,
    inverter: { ratingW: 5000, efficiency: 0.95, standingLossFraction: 0.005 },
    ...change,
  };
}
