import type { Machine } from '../../src/machine.js';
import { BENCH_DISH, CHECK_COIL, cellSettings } from '../receivers/machines.js';

const MORNING = [0, 0, 0, 0, 0, 0, 1, 1, 1, 1, 1, 1, 1, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0];
const EVERY_MONTH = Array<number>(12).fill(1);

/** A dish with coil, loop, tank and morning load, for runs in tests. */
export const COIL_MACHINE: Machine = {
  place: { horizon: [] },
  outages: [],
  dish: BENCH_DISH,
  tracker: {
    azimuthSpanRad: (250 * Math.PI) / 180,
    azimuthCentreOffsetRad: 0,
    elevationMinRad: (5 * Math.PI) / 180,
    elevationMaxRad: Math.PI / 2,
    startDniWm2: 100,
    stowWindMs: 13,
    resumeWindMs: 11,
    resumeAfterS: 900,
  },
  trackerPower: { standbyW: 10, movingW: 40 },
  receiver: { ...CHECK_COIL, face: { ...CHECK_COIL.face, sideM: 0.28 }, coilUaWK: 18 },
  loop: {
    setPointC: 93,
    outletLimitC: 99,
    minFlowKgS: 0.01,
    maxFlowKgS: 0.3,
    startDifferenceK: 6,
    stopDifferenceK: 2,
    pressureDropPa: 60_000,
    pumpEfficiency: 0.25,
    pipe: {
      kind: 'exposed',
      lengthM: 8,
      boreM: 0.02,
      wallM: 0.001,
      insulationM: 0.03,
      insulationConductivityWmK: 0.04,
      outsideFilmWm2K: 20,
    },
  },
  tank: {
    volumeM3: 2,
    layers: 10,
    heightM: 2,
    lossUaWK: 3,
    surroundings: { kind: 'plantRoom', temperatureC: 20 },
    effectiveConductivityWmK: 1.2,
    chargeInlet: { kind: 'matchingLayer' },
  },
  store: { initialC: 40, topLimitC: 95, topHysteresisK: 5 },
  load: {
    kind: 'commercialHotWater',
    volumePerDayM3: 1,
    setPointC: 82,
    schedule: { hourlyWeights: MORNING, weekendFactor: 0.4, monthFactors: EVERY_MONTH },
    boilerCapacityW: 40_000,
    boilerEfficiency: 0.85,
  },
  electricityUse: {
    annualUseJ: 12_000 * 3.6e6,
    schedule: { hourlyWeights: Array<number>(24).fill(1), weekendFactor: 0.6, monthFactors: EVERY_MONTH },
  },
  stepS: 300,
};

export const CELL_MACHINE: Machine = {
  ...COIL_MACHINE,
  receiver: cellSettings(),
  loop: { ...COIL_MACHINE.loop, setPointC: 84, outletLimitC: 85 },
};
