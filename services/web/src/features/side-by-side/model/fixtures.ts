import { LEDGER_LINES, LEDGER_PARTS, MODEL_VERSION, TRACKER_STATES, type LedgerLine } from '@noonwell/engine';
import {
  SUMMARY_FORMAT,
  SUMMARY_FORMAT_VERSION,
  newScenario,
  runSummarySchema,
  type RunSummary,
  type Scenario,
} from '@noonwell/schema';
import type { Compared } from './compared.js';

/** For tests: a small ledger in kWh that balances part by part; the numbers mean nothing. */
export const BALANCED: Partial<Record<LedgerLine, number>> = {
  beamOnAperture: 1000,
  nightPark: 100,
  absorbed: 900,
  radiation: 200,
  powerDc: 0,
  heatToFluid: 700,
  supplyPipeLoss: 50,
  heatToStore: 650,
  shellLoss: 40,
  storeStored: -10,
  heatDelivered: 620,
  backupHeat: 380,
  loadHeat: 1000,
  gridImport: 110,
  siteUse: 100,
  pumpUse: 5,
  trackerUse: 5,
};

export interface FixtureChanges {
  readonly summary?: Partial<Omit<RunSummary, 'ledger'>>;
  readonly lines?: Partial<Record<LedgerLine, number>>;
  readonly document?: Scenario;
  readonly compared?: Partial<Omit<Compared, 'summary' | 'document'>>;
}

export function comparedFixture(changes: FixtureChanges = {}): Compared {
  return {
    scenarioId: '00000000-0000-4000-8000-000000000001',
    runId: '00000000-0000-4000-8000-0000000000c1',
    name: 'Coil',
    position: 0,
    version: 1,
    weatherYearId: '00000000-0000-4000-8000-0000000000aa',
    weatherYearName: 'Invented desert',
    document: changes.document ?? newScenario('coil'),
    summary: summaryFixture(changes),
    ...changes.compared,
  };
}

export function summaryFixture(changes: FixtureChanges = {}): RunSummary {
  const lines = Object.fromEntries(
    LEDGER_LINES.map(({ key }) => [key, { ...BALANCED, ...changes.lines }[key] ?? 0]),
  );
  const kwh = (key: LedgerLine) => lines[key] ?? 0;
  const months = (total: number) => Array<number>(12).fill(total / 12);
  return runSummarySchema.parse({
    format: SUMMARY_FORMAT,
    formatVersion: SUMMARY_FORMAT_VERSION,
    modelVersion: MODEL_VERSION,
    stepMinutes: 5,
    records: 8760,
    hours: 8760,
    weather: { latitudeDeg: 30, longitudeDeg: 10, altitudeM: 200, dniKwhM2: 2400, dryBulbMeanC: 18 },
    apertureAreaM2: 19.6,
    rimAngleDeg: 45,
    interceptFactor: 0.95,
    geometricConcentration: 250,
    beamOnApertureKwh: kwh('beamOnAperture'),
    heatToFluidKwh: kwh('heatToFluid'),
    heatToStoreKwh: kwh('heatToStore'),
    heatDeliveredKwh: kwh('heatDelivered'),
    backupHeatKwh: kwh('backupHeat'),
    unmetHeatKwh: kwh('unmetHeat'),
    loadHeatKwh: kwh('loadHeat'),
    solarFraction: 0.62,
    boilerFuelKwh: kwh('backupHeat') / 0.85,
    powerDcKwh: kwh('powerDc'),
    powerAcKwh: kwh('powerDc') - kwh('inverterLoss'),
    siteUseKwh: kwh('siteUse'),
    pumpUseKwh: kwh('pumpUse'),
    trackerUseKwh: kwh('trackerUse'),
    ownUseKwh: kwh('powerDc') - kwh('inverterLoss') - kwh('gridExport'),
    gridImportKwh: kwh('gridImport'),
    gridExportKwh: kwh('gridExport'),
    heatToFluidOfBeam: kwh('heatToFluid') / kwh('beamOnAperture'),
    powerAcOfBeam: kwh('powerDc') / kwh('beamOnAperture'),
    faceMaxC: 300,
    cellMaxC: null,
    tankTopMaxC: 94,
    outletMaxC: 97,
    pumpHours: 2500,
    pipeFreezeHours: 0,
    trackerHours: Object.fromEntries(TRACKER_STATES.map((state) => [state, 0])),
    monthly: {
      beamOnApertureKwh: months(kwh('beamOnAperture')),
      heatDeliveredKwh: months(kwh('heatDelivered')),
      backupHeatKwh: months(kwh('backupHeat')),
      loadHeatKwh: months(kwh('loadHeat')),
      powerAcKwh: months(kwh('powerDc')),
      ownUseKwh: months(kwh('powerDc')),
      gridExportKwh: months(kwh('gridExport')),
    },
    ledger: {
      lines,
      partResiduals: Object.fromEntries(LEDGER_PARTS.map((part) => [part, 0])),
      residualKwh: 0,
      residualOfBeam: 0,
    },
    ...changes.summary,
  });
}
