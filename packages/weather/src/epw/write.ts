import type { WeatherYear } from '@noonwell/engine';
import { WEEKDAYS } from '../calendar.js';
import type { WeatherHeader } from '../result.js';
import { EPW_CELLS, EPW_COLUMNS, EPW_TIME_CELLS } from './columns.js';

export interface EpwWriteOptions {
  /** Names for the LOCATION line. */
  readonly header: Omit<WeatherHeader, 'placeName'>;
  /** Text of the COMMENTS 1 line. */
  readonly comment?: string;
}

const MISSING_CELL = '9999';

/**
 * Writes a weather year as an EPW file: 35 columns, LF line ends, hour 1 … 24 ending at the label.
 *
 * @param year hourly records from 1 January to 31 December
 * @returns lines of text, header first; values have the format's usual digits, so a year read back differs by that rounding
 * @throws RangeError when the records are not hourly
 */
export function writeEpw(year: WeatherYear, options: EpwWriteOptions): string {
  if (year.intervalMinutes !== 60) throw new RangeError('an EPW file holds hourly records');
  const { city, region, country, source, wmo } = options.header;
  const names = [city, region, country, source, wmo].map(quote);
  const place = [
    year.latitudeDeg.toFixed(4),
    year.longitudeDeg.toFixed(4),
    year.utcOffsetHours,
    year.altitudeM.toFixed(1),
  ];
  const lines = [
    `LOCATION,${[...names, ...place].join(',')}`,
    'DESIGN CONDITIONS,0',
    'TYPICAL/EXTREME PERIODS,0',
    'GROUND TEMPERATURES,0',
    `HOLIDAYS/DAYLIGHT SAVINGS,${year.startLocalMs.length === 8784 ? 'Yes' : 'No'},0,0,0`,
    `COMMENTS 1,${options.comment ?? ''}`,
    'COMMENTS 2,',
    `DATA PERIODS,1,1,Data,${WEEKDAYS[year.firstWeekday] ?? ''}, 1/ 1,12/31`,
  ];
  const cells = new Array<string>(EPW_CELLS);
  for (let at = 0; at < year.startLocalMs.length; at += 1) {
    const start = new Date(year.startLocalMs[at]!);
    cells.fill(MISSING_CELL);
    cells[EPW_TIME_CELLS.year - 1] = String(start.getUTCFullYear());
    cells[EPW_TIME_CELLS.month - 1] = String(start.getUTCMonth() + 1);
    cells[EPW_TIME_CELLS.day - 1] = String(start.getUTCDate());
    cells[EPW_TIME_CELLS.hour - 1] = String(start.getUTCHours() + 1);
    cells[EPW_TIME_CELLS.minute - 1] = '0';
    for (const column of EPW_COLUMNS)
      cells[column.cell - 1] = year[column.channel][at]!.toFixed(column.digits);
    lines.push(cells.join(','));
  }
  return `${lines.join('\n')}\n`;
}

function quote(name: string): string {
  return /[",\r\n]/.test(name) ? `"${name.replaceAll('"', '""')}"` : name;
}
