import type { WeatherYear } from '@noonwell/engine';
import { applyRowDefect, type RowDefect } from './row-defects.js';
import { fileOfLines, type TextFileOptions } from './text.js';

export interface Tmy3FileOptions extends TextFileOptions {
  readonly name?: string;
  /** 68: without the three columns of the albedo. */
  readonly columns?: 68 | 71;
  /** Calendar year of each month, January first; the year's own otherwise. */
  readonly yearOfMonth?: readonly number[];
  /** Text of line 1 in place of the station's. */
  readonly stationLine?: string;
  readonly defects?: readonly RowDefect[];
}

/** Fields with a unit, a source and an uncertainty column each. Source: NREL/TP-581-43156, table of the data fields. */
const FIELDS = [
  'GHI (W/m^2)',
  'DNI (W/m^2)',
  'DHI (W/m^2)',
  'GH illum (lx)',
  'DN illum (lx)',
  'DH illum (lx)',
  'Zenith lum (cd/m^2)',
  'TotCld (tenths)',
  'OpqCld (tenths)',
  'Dry-bulb (C)',
  'Dew-point (C)',
  'RHum (%)',
  'Pressure (mbar)',
  'Wdir (degrees)',
  'Wspd (m/s)',
  'Hvis (m)',
  'CeilHgt (m)',
  'Pwat (cm)',
  'AOD (unitless)',
  'Alb (unitless)',
] as const;
const ALBEDO = 'Alb (unitless)';

/** Column of a field in a TMY3 file, from 1. */
export function tmy3Column(field: (typeof FIELDS)[number]): number {
  return 5 + 3 * FIELDS.indexOf(field);
}

/** Line of the file, from 1, on which a row of a sound file stands. */
export function tmy3LineOfRow(row: number): number {
  return row + 3;
}

/** A TMY3 table as bytes, sound or with the damage asked for; pressure in whole mbar. */
export function tmy3File(year: WeatherYear, options: Tmy3FileOptions = {}): Uint8Array<ArrayBuffer> {
  const { columns = 71, defects = [] } = options;
  const fields = FIELDS.filter((field) => columns === 71 || field !== ALBEDO);
  const station = [
    '000000',
    `"${options.name ?? 'TEST FIELD'}"`,
    'TF',
    year.utcOffsetHours.toFixed(1),
    year.latitudeDeg.toFixed(3),
    year.longitudeDeg.toFixed(3),
    year.altitudeM.toFixed(0),
  ].join(',');
  const headings = [
    'Date (MM/DD/YYYY)',
    'Time (HH:MM)',
    'ETR (W/m^2)',
    'ETRN (W/m^2)',
    ...fields.flatMap((field) => {
      const name = field.slice(0, field.indexOf(' ('));
      return [field, `${name} source`, `${name} uncert (code)`];
    }),
    'Lprecip depth (mm)',
    'Lprecip quantity (hr)',
    'Lprecip source',
    'Lprecip uncert (code)',
    'PresWth (METAR code)',
    'PresWth source',
    'PresWth uncert (code)',
  ];
  let rows = Array.from(year.startLocalMs, (startMs, at) => {
    const start = new Date(startMs);
    const month = start.getUTCMonth();
    const values: Partial<Record<(typeof FIELDS)[number], string>> = {
      'GHI (W/m^2)': year.ghiWm2[at]!.toFixed(0),
      'DNI (W/m^2)': year.dniWm2[at]!.toFixed(0),
      'DHI (W/m^2)': year.dhiWm2[at]!.toFixed(0),
      'Dry-bulb (C)': year.dryBulbC[at]!.toFixed(1),
      'RHum (%)': year.relativeHumidityPct[at]!.toFixed(0),
      'Pressure (mbar)': (year.pressurePa[at]! / 100).toFixed(0),
      'Wspd (m/s)': year.windMs[at]!.toFixed(1),
    };
    const two = (number: number) => String(number).padStart(2, '0');
    return [
      `${two(month + 1)}/${two(start.getUTCDate())}/${options.yearOfMonth?.[month] ?? start.getUTCFullYear()}`,
      `${two(start.getUTCHours() + 1)}:00`,
      '0',
      '0',
      ...fields.flatMap((field) => [values[field] ?? '0', 'A', '7']),
      ...['0', '1', 'D', '9', '00', 'C', '8'],
    ].join(',');
  });
  for (const defect of defects) rows = applyRowDefect(rows, defect, ',');
  const isCut = defects.some(({ kind }) => kind === 'truncated');
  return fileOfLines([options.stationLine ?? station, headings.join(','), ...rows], options, isCut);
}
