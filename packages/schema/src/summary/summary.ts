import {
  LEDGER_LINES,
  LEDGER_PARTS,
  TRACKER_STATES,
  type LedgerLine,
  type TrackerState,
} from '@noonwell/engine';
import { z } from 'zod';

export const SUMMARY_FORMAT = 'noonwell-summary';
export const SUMMARY_FORMAT_VERSION = 1;

/** A number of the summary with its unit and meaning: the API document and the command line's help print them. */
function figure(unit: string, description: string) {
  return z.number().meta({ unit, description });
}

const keysOf = <const Key extends string>(keys: readonly Key[]) => z.enum(keys);
/**
 * States, and their lines of the ledger, that the engine has learned since summaries were first stored: one
 * written before spent no time and lost no beam in them.
 */
const LATER_STATES = ['belowHorizonProfile', 'outOfService'] as const satisfies readonly (TrackerState &
  LedgerLine)[];
const ZEROS = Object.fromEntries(LATER_STATES.map((state) => [state, 0]));
const withLater = (value: unknown): unknown =>
  typeof value === 'object' && value !== null ? { ...ZEROS, ...value } : value;
const lineKeys = LEDGER_LINES.map((line): LedgerLine => line.key);
const monthly = (unit: string, description: string) =>
  z
    .array(z.number())
    .length(12)
    .meta({ unit, description: `${description}, January to December` });

export const runSummarySchema = z.object({
  format: z.literal(SUMMARY_FORMAT),
  formatVersion: z.literal(SUMMARY_FORMAT_VERSION),
  modelVersion: z.string().meta({ description: 'Version of the calculation' }),
  stepMinutes: figure('min', 'Time step'),
  records: figure('1', 'Weather records run through'),
  hours: figure('h', 'Time run through'),
  weather: z.object({
    latitudeDeg: figure('°', 'North positive'),
    longitudeDeg: figure('°', 'East positive'),
    altitudeM: figure('m', 'Above sea level'),
    dniKwhM2: figure('kWh/m²', 'Beam on a surface that faces the sun'),
    dryBulbMeanC: figure('°C', 'Mean air temperature'),
  }),
  apertureAreaM2: figure('m²', 'Gross aperture of the dish'),
  rimAngleDeg: figure('°', 'Rim angle of the dish'),
  interceptFactor: figure('1', "Share of the reflected light that the receiver's opening takes up"),
  geometricConcentration: figure('1', "Gross aperture over the area of the receiver's opening"),
  beamOnApertureKwh: figure('kWh', 'Beam on the gross aperture, as if it always faced the sun'),
  heatToFluidKwh: figure('kWh', 'Heat from the receiver to the water'),
  heatToStoreKwh: figure('kWh', 'Heat that reached the tank'),
  heatDeliveredKwh: figure('kWh', 'Solar heat delivered to the load'),
  backupHeatKwh: figure('kWh', 'Heat from the backup boiler'),
  unmetHeatKwh: figure('kWh', 'Heat wanted and not supplied'),
  loadHeatKwh: figure('kWh', 'Heat that the load needs'),
  solarFraction: figure(
    '1',
    'Solar fraction: 1 − backup heat / heat that the load needs; 0 where there is no load',
  ),
  boilerFuelKwh: figure('kWh', 'Fuel energy that the boiler burned'),
  powerDcKwh: figure('kWh', 'Electricity from the cells, direct current'),
  powerAcKwh: figure('kWh', 'Electricity behind the inverter'),
  siteUseKwh: figure('kWh', 'Electricity that the site uses'),
  pumpUseKwh: figure('kWh', 'Electricity for the pump'),
  trackerUseKwh: figure('kWh', 'Electricity for the tracker'),
  ownUseKwh: figure('kWh', 'Electricity from the dish used on the site, pump and tracker included'),
  gridImportKwh: figure('kWh', 'Electricity bought'),
  gridExportKwh: figure('kWh', 'Electricity sold'),
  heatToFluidOfBeam: figure('1', 'Heat to the water over beam on the aperture'),
  powerAcOfBeam: figure('1', 'Electricity behind the inverter over beam on the aperture'),
  faceMaxC: figure('°C', 'Hottest mean face temperature of the receiver'),
  cellMaxC: figure('°C', 'Hottest cell').nullable(),
  tankTopMaxC: figure('°C', 'Hottest top layer of the tank'),
  outletMaxC: figure('°C', "Hottest water at the receiver's outlet"),
  pumpHours: figure('h', 'Hours with the pump running'),
  pipeFreezeHours: figure('h', 'Hours with water in a pipe below 0 °C: a plain-water loop would freeze'),
  trackerHours: z
    .preprocess(withLater, z.record(keysOf(TRACKER_STATES), z.number()))
    .meta({ unit: 'h', description: 'Hours in each state of the tracker' }),
  monthly: z.object({
    beamOnApertureKwh: monthly('kWh', 'Beam on the gross aperture'),
    heatDeliveredKwh: monthly('kWh', 'Solar heat delivered'),
    backupHeatKwh: monthly('kWh', 'Heat from the backup'),
    loadHeatKwh: monthly('kWh', 'Heat that the load needs'),
    powerAcKwh: monthly('kWh', 'Electricity behind the inverter'),
    ownUseKwh: monthly('kWh', 'Electricity from the dish used on the site'),
    gridExportKwh: monthly('kWh', 'Electricity sold'),
  }),
  ledger: z.object({
    lines: z
      .preprocess(withLater, z.record(keysOf(lineKeys), z.number()))
      .meta({ unit: 'kWh', description: 'Every line of the ledger over the year' }),
    partResiduals: z
      .record(keysOf(LEDGER_PARTS), z.number())
      .meta({ unit: 'kWh', description: 'What enters each part minus what leaves and stays' }),
    residualKwh: figure('kWh', "Sum of the parts' residuals by size"),
    residualOfBeam: figure('1', 'That sum over the beam on the aperture; a run above 1e-9 is an error'),
  }),
});
/** The summary's shape, for the written reference. */
export const RUN_SUMMARY_SHAPE: z.ZodObject = runSummarySchema;
export type RunSummary = z.infer<typeof runSummarySchema>;

/** The one way a summary is written: the command line and the app give the same bytes for the same run. */
export function serializeSummary(summary: RunSummary): string {
  return `${JSON.stringify(runSummarySchema.parse(summary), null, 2)}\n`;
}
