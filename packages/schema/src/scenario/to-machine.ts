import { JOULES_PER_KWH, type Machine } from '@noonwell/engine';
import { loadDefinition } from './loads/index.js';
import { readMonthDay } from './outages.js';
import { toPipeSettings } from './pipes/index.js';
import { receiverDefinition } from './receivers/index.js';
import type { Scenario } from './scenario.js';
import { toSchedule } from './schedule.js';

const DEG = Math.PI / 180;

/** From the scenario's units to the engine's: SI, radians, °C. The only place where they are converted. */
export function toMachine(scenario: Scenario): Machine {
  const { dish, tracker, outages, receiver } = scenario.catch;
  const { pump, pipe, tank } = scenario.carryAndKeep;
  const [load] = scenario.use.loads;
  if (!load) throw new TypeError('a scenario has one load');
  return {
    place: {
      horizon: scenario.place.horizon.map(({ azimuthDeg, elevationDeg }) => ({
        azimuthRad: azimuthDeg * DEG,
        elevationRad: elevationDeg * DEG,
      })),
    },
    outages: outages.map(({ from, to }) => ({ from: monthDay(from), to: monthDay(to) })),
    dish: {
      apertureDiameterM: dish.apertureDiameterM,
      focalRatio: dish.focalRatio,
      slopeErrorRad: dish.slopeErrorMrad / 1000,
      sunWidthRad: dish.sunWidthMrad / 1000,
      specularErrorRad: dish.specularErrorMrad / 1000,
      trackingErrorRad: dish.trackingErrorMrad / 1000,
      reflectance: dish.reflectance,
      cleanliness: dish.cleanliness,
      shadowFraction: dish.shadowFraction,
    },
    tracker: {
      azimuthSpanRad: tracker.azimuthSpanDeg * DEG,
      azimuthCentreOffsetRad: tracker.azimuthCentreOffsetDeg * DEG,
      elevationMinRad: tracker.elevationMinDeg * DEG,
      elevationMaxRad: tracker.elevationMaxDeg * DEG,
      startDniWm2: tracker.startDniWm2,
      stowWindMs: tracker.stowWindMs,
      resumeWindMs: tracker.resumeWindMs,
      resumeAfterS: tracker.resumeAfterMinutes * 60,
    },
    trackerPower: { standbyW: tracker.standbyPowerW, movingW: tracker.movingPowerW },
    receiver: receiverDefinition(receiver.kind).toSettings(receiver),
    loop: {
      setPointC: pump.setPointC,
      outletLimitC: pump.outletLimitC,
      minFlowKgS: pump.minFlowKgS,
      maxFlowKgS: pump.maxFlowKgS,
      startDifferenceK: pump.startDifferenceK,
      stopDifferenceK: pump.stopDifferenceK,
      pressureDropPa: pump.pressureDropKpa * 1000,
      pumpEfficiency: pump.efficiency,
      pipe: toPipeSettings(pipe),
    },
    tank: {
      volumeM3: tank.volumeM3,
      layers: tank.layers,
      heightM: tank.heightM,
      lossUaWK: tank.lossUaWK,
      surroundings: tank.surroundings,
      effectiveConductivityWmK: tank.effectiveConductivityWmK,
      chargeInlet: tank.chargeInlet,
    },
    store: {
      initialC: tank.initialTemperatureC,
      topLimitC: tank.topLimitC,
      topHysteresisK: tank.topHysteresisK,
    },
    load: loadDefinition(load.kind).toSettings(load),
    electricityUse: {
      annualUseJ: scenario.use.electricity.annualUseKwh * JOULES_PER_KWH,
      schedule: toSchedule(scenario.use.electricity),
    },
    stepS: scenario.simulation.stepMinutes * 60,
  };
}

function monthDay(text: string) {
  const day = readMonthDay(text);
  if (!day) throw new TypeError(`no day ${text}`);
  return day;
}
