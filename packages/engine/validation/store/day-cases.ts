import { MEAN_HEAT_CAPACITY } from '../../src/water/coefficients.js';
import type { TankSettings } from '../../src/store/stratified-tank.js';
import { waterDensityKgM3 } from '../../src/water/water.js';

/** A day of charging and drawing: what both the engine's tank and scipy's solver are given. */
export interface DayCase {
  readonly name: string;
  readonly tank: TankSettings;
  readonly massKg: number;
  readonly meanHeatCapacity: readonly number[];
  readonly initialC: number;
  readonly mainsC: number;
  readonly setPointC: number;
  readonly stepS: number;
  /** One value for each hour of the day. */
  readonly chargeFlowKgS: readonly number[];
  readonly chargeEnthalpyRiseJkg: readonly number[];
  readonly loadFlowKgS: readonly number[];
}

const START_C = 45;

const tank: TankSettings = {
  volumeM3: 2,
  layers: 10,
  heightM: 2.2,
  lossUaWK: 5,
  surroundings: { kind: 'plantRoom', temperatureC: 20 },
  effectiveConductivityWmK: 1.5,
  chargeInlet: { kind: 'matchingLayer' },
};

const common = {
  massKg: tank.volumeM3 * waterDensityKgM3(START_C),
  meanHeatCapacity: MEAN_HEAT_CAPACITY,
  initialC: START_C,
  mainsC: 11,
  setPointC: 60,
  stepS: 300,
  // Sun from 8 to 17 h with a cloudy noon, when the stream is cooler than the top; a load from 6 to 20 h.
  chargeFlowKgS: [
    0, 0, 0, 0, 0, 0, 0, 0, 0.05, 0.08, 0.1, 0.12, 0.14, 0.12, 0.1, 0.09, 0.06, 0, 0, 0, 0, 0, 0, 0,
  ],
  chargeEnthalpyRiseJkg: [
    0, 0, 0, 0, 0, 0, 0, 0, 30, 45, 60, 55, 15, 12, 50, 45, 20, 0, 0, 0, 0, 0, 0, 0,
  ].map((kelvin) => kelvin * 4180),
  loadFlowKgS: [
    0, 0, 0, 0, 0, 0, 0.04, 0.06, 0.05, 0.03, 0.02, 0, 0.08, 0.03, 0.02, 0.02, 0.03, 0.05, 0.09, 0.04, 0, 0,
    0, 0,
  ],
};

/** The same day with each kind of inlet: the fixed one at half height sets off plumes that mix what is above. */
export const DAY_CASES: readonly DayCase[] = [
  { ...common, name: 'matching inlet', tank },
  {
    ...common,
    name: 'fixed inlet at half height',
    tank: { ...tank, chargeInlet: { kind: 'fixedHeight', heightFraction: 0.5 } },
  },
];
