import type { LoadSettings, Machine, ReceiverSettings, Schedule } from '@noonwell/engine';
import type { ReceiverDocument } from './receivers/index.js';
import type { Scenario } from './scenario.js';

const DEG = Math.PI / 180;
const JOULES_PER_KWH = 3.6e6;

/** From the scenario's units to the engine's: SI, radians, °C. The only place where they are converted. */
export function toMachine(scenario: Scenario): Machine {
  const { dish, tracker, receiver } = scenario.catch;
  const { pump, pipe, tank } = scenario.carryAndKeep;
  const [load] = scenario.use.loads;
  if (!load) throw new TypeError('a scenario has one load');
  return {
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
    receiver: toReceiver(receiver),
    loop: {
      setPointC: pump.setPointC,
      outletLimitC: pump.outletLimitC,
      minFlowKgS: pump.minFlowKgS,
      maxFlowKgS: pump.maxFlowKgS,
      startDifferenceK: pump.startDifferenceK,
      stopDifferenceK: pump.stopDifferenceK,
      pressureDropPa: pump.pressureDropKpa * 1000,
      pumpEfficiency: pump.efficiency,
      pipe: {
        lengthM: pipe.lengthM,
        boreM: pipe.boreMm / 1000,
        wallM: pipe.wallMm / 1000,
        insulationM: pipe.insulationMm / 1000,
        insulationConductivityWmK: pipe.insulationConductivityWmK,
        outsideFilmWm2K: pipe.outsideFilmWm2K,
      },
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
    load: toLoad(load),
    electricityUse: {
      annualUseJ: scenario.use.electricity.annualUseKwh * JOULES_PER_KWH,
      schedule: toSchedule(scenario.use.electricity),
    },
    stepS: scenario.simulation.stepMinutes * 60,
  };
}

function toSchedule(fields: Schedule): Schedule {
  return {
    hourlyWeights: fields.hourlyWeights,
    weekendFactor: fields.weekendFactor,
    monthFactors: fields.monthFactors,
  };
}

function toLoad(load: Scenario['use']['loads'][number]): LoadSettings {
  return {
    kind: load.kind,
    volumePerDayM3: load.litresPerDay / 1000,
    setPointC: load.setPointC,
    schedule: toSchedule(load),
    boilerCapacityW: load.boilerCapacityKw * 1000,
    boilerEfficiency: load.boilerEfficiency,
  };
}

function toReceiver(receiver: ReceiverDocument): ReceiverSettings {
  const face = {
    sideM: receiver.faceSideM,
    absorptance: receiver.absorptance,
    emittance: receiver.emittance,
    backLossWK: receiver.backLossWK,
    heatCapacityJK: receiver.heatCapacityJK,
    windHeightFactor: receiver.windHeightFactor,
  };
  switch (receiver.kind) {
    case 'coil':
      return { kind: 'coil', face, coilUaWK: receiver.coilUaWK };
    case 'cell':
      return {
        kind: 'cell',
        face,
        secondary: receiver.secondary,
        cell: {
          referenceEfficiency: receiver.referenceEfficiency,
          referenceConcentration: receiver.referenceConcentration,
          referenceTemperatureC: receiver.referenceTemperatureC,
          seriesConcentration: receiver.seriesConcentration,
          temperatureCoefficientPerK: receiver.temperatureCoefficientPerK,
          openCircuitVoltageV: receiver.openCircuitVoltageV,
          idealityFactor: receiver.idealityFactor,
          operatingVoltageV: receiver.operatingVoltageV,
          bypassVoltageV: receiver.bypassVoltageV,
          areaResistanceM2KW: receiver.cellAreaResistanceM2KW,
          temperatureLimitC: receiver.cellTemperatureLimitC,
        },
        grouping: receiver.grouping,
        cellsPerSide: receiver.cellsPerSide,
        packingFraction: receiver.packingFraction,
        plateUaWK: receiver.plateUaWK,
        inverter: {
          ratingW: receiver.inverterRatingW,
          efficiency: receiver.inverterEfficiency,
          standingLossFraction: receiver.inverterStandingLossFraction,
        },
      };
  }
}
