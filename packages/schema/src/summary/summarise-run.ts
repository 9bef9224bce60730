import {
  ACCOUNTS,
  ACCOUNT_INDEX,
  JOULES_PER_KWH,
  LEDGER_LINES,
  LEDGER_PARTS,
  TRACKER_STATES,
  partResidual,
  type Account,
  type RunResult,
} from '@noonwell/engine';
import { SUMMARY_FORMAT, SUMMARY_FORMAT_VERSION, runSummarySchema, type RunSummary } from './summary.js';

/** The summary of a finished run: the engine's joules, seconds and radians in the units of people. */
export function summariseRun(result: RunResult): RunSummary {
  const kwh = (account: Account) => result.accountsJ[ACCOUNT_INDEX[account]]! / JOULES_PER_KWH;
  const months = (account: Account) =>
    Array.from(
      { length: 12 },
      (_, month) =>
        result.monthlyAccountsJ[month * ACCOUNTS.length + ACCOUNT_INDEX[account]]! / JOULES_PER_KWH,
    );
  const ratio = (part: number, whole: number) => (whole > 0 ? part / whole : 0);
  const residuals = LEDGER_PARTS.map((part) => partResidual(part, result.accountsJ) / JOULES_PER_KWH);
  const residualKwh = residuals.reduce((total, residual) => total + Math.abs(residual), 0);
  const beamKwh = kwh('beamOnAperture');

  return runSummarySchema.parse({
    format: SUMMARY_FORMAT,
    formatVersion: SUMMARY_FORMAT_VERSION,
    modelVersion: result.modelVersion,
    stepMinutes: result.stepS / 60,
    records: result.records,
    hours: (result.records * result.intervalS) / 3600,
    weather: {
      latitudeDeg: result.weather.latitudeDeg,
      longitudeDeg: result.weather.longitudeDeg,
      altitudeM: result.weather.altitudeM,
      dniKwhM2: result.weather.dniJm2 / JOULES_PER_KWH,
      dryBulbMeanC: result.weather.dryBulbMeanC,
    },
    apertureAreaM2: result.apertureAreaM2,
    rimAngleDeg: (result.rimAngleRad * 180) / Math.PI,
    interceptFactor: result.interceptFactor,
    geometricConcentration: result.geometricConcentration,
    beamOnApertureKwh: beamKwh,
    heatToFluidKwh: kwh('heatToFluid'),
    heatToStoreKwh: kwh('heatToStore'),
    heatDeliveredKwh: kwh('heatDelivered'),
    backupHeatKwh: kwh('backupHeat'),
    unmetHeatKwh: kwh('unmetHeat'),
    loadHeatKwh: kwh('loadHeat'),
    solarFraction: kwh('loadHeat') > 0 ? 1 - kwh('backupHeat') / kwh('loadHeat') : 0,
    boilerFuelKwh: kwh('boilerFuel'),
    powerDcKwh: kwh('powerDc'),
    powerAcKwh: kwh('powerAc'),
    siteUseKwh: kwh('siteUse'),
    pumpUseKwh: kwh('pumpUse'),
    trackerUseKwh: kwh('trackerUse'),
    ownUseKwh: kwh('ownUse'),
    gridImportKwh: kwh('gridImport'),
    gridExportKwh: kwh('gridExport'),
    heatToFluidOfBeam: ratio(kwh('heatToFluid'), beamKwh),
    powerAcOfBeam: ratio(kwh('powerAc'), beamKwh),
    faceMaxC: result.faceMaxC,
    cellMaxC: result.cellMaxC,
    tankTopMaxC: result.tankTopMaxC,
    outletMaxC: result.outletMaxC,
    pumpHours: result.pumpSeconds / 3600,
    pipeFreezeHours: result.pipeFreezeSeconds / 3600,
    trackerHours: Object.fromEntries(
      TRACKER_STATES.map((state) => [state, result.trackerSeconds[state] / 3600]),
    ),
    monthly: {
      beamOnApertureKwh: months('beamOnAperture'),
      heatDeliveredKwh: months('heatDelivered'),
      backupHeatKwh: months('backupHeat'),
      loadHeatKwh: months('loadHeat'),
      powerAcKwh: months('powerAc'),
      ownUseKwh: months('ownUse'),
      gridExportKwh: months('gridExport'),
    },
    ledger: {
      lines: Object.fromEntries(LEDGER_LINES.map((line) => [line.key, kwh(line.key)])),
      partResiduals: Object.fromEntries(LEDGER_PARTS.map((part, index) => [part, residuals[index]])),
      residualKwh,
      residualOfBeam: ratio(residualKwh, beamKwh),
    },
  });
}
