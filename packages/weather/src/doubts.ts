import { extraterrestrialNormalWm2, type WeatherYear } from '@noonwell/engine';
import type { TableLabel } from '@noonwell/schema';
import { standardAltitudeM } from './atmosphere.js';
import { MONTHS } from './calendar.js';
import { intervalOfLabel, labelNearest, labelToMiddleMinutes } from './label.js';
import { isAtSearchEnd, type SunOffset } from './sun-offset.js';

/** Offsets nearer than this to the expected one are the search's own coarseness (own choice). */
const CLOCK_TOLERANCE_MINUTES = 10;
/** A month is doubted when its clock differs this much from the year's (own choice; a shifted month differs by 60). */
const MONTH_TOLERANCE_MINUTES = 30;
/** Closure worse than this means that the three irradiances do not belong together (own choice, twice the 8 % of Long & Shi 2008). */
const CLOSURE_TOLERANCE = 0.16;
/**
 * Altitude from the mean pressure against the stated one [m]. Yearly mean pressure at sea level stays within
 * about 1.5 kPa, 125 m, wherever people live (value from memory); the rest is the file's own rounding.
 */
const ALTITUDE_TOLERANCE_M = 250;
/** Zones follow borders: up to 2 h from the sun's time are in lawful use, more is doubted (common practice, no source). */
const ZONE_TOLERANCE_HOURS = 2;
const DAY_MS = 86_400_000;

/** Plain sentences about what looks wrong in a year that can nevertheless be read. Nothing is changed. */
export function doubts(year: WeatherYear, clock: SunOffset, label: TableLabel): string[] {
  return [
    ...clockDoubts(clock, label, year.intervalMinutes),
    ...altitudeDoubts(year),
    ...beamDoubts(year),
    ...zoneDoubts(year),
  ];
}

function clockDoubts(clock: SunOffset, label: TableLabel, intervalMinutes: number): string[] {
  const { bestMinutes, closureError } = clock;
  const expected = labelToMiddleMinutes(label, intervalMinutes);
  if (bestMinutes === null || closureError === null) {
    return ['There are too few sunny hours to check the clock against the sun.'];
  }
  const found: string[] = [];
  if (Math.abs(bestMinutes - expected) >= CLOCK_TOLERANCE_MINUTES) {
    const beyond = isAtSearchEnd(bestMinutes) ? ' or beyond' : '';
    const other = labelNearest(bestMinutes, intervalMinutes, CLOCK_TOLERANCE_MINUTES);
    const instead =
      other === null ? '' : ` It would fit means over ${intervalOfLabel(other, intervalMinutes)}.`;
    found.push(
      `The irradiance fits the sun best ${signed(bestMinutes)} min from the label${beyond}; means over ${intervalOfLabel(label, intervalMinutes)} fit at ${signed(expected)} min.${instead} ` +
        `The records may be ${describeShift(bestMinutes - expected)}, or the time zone or longitude is wrong. The year is used as it stands.`,
    );
  }
  const shifted = clock.monthlyBestMinutes.flatMap((minutes, month) =>
    minutes !== null && Math.abs(minutes - bestMinutes) >= MONTH_TOLERANCE_MINUTES
      ? [`${MONTHS[month]!} (${signed(minutes)} min)`]
      : [],
  );
  if (shifted.length > 0) {
    found.push(
      `The clock of some months differs from the rest of the year (${signed(bestMinutes)} min): ${shifted.join(', ')}. They may be shifted, as by daylight saving time.`,
    );
  }
  if (closureError > CLOSURE_TOLERANCE) {
    found.push(
      `GHI, DHI and DNI do not agree with each other: they miss closure by ${(closureError * 100).toFixed(0)} % of GHI even at the best clock. Latitude, longitude or one of the three columns may be wrong.`,
    );
  }
  return found;
}

function describeShift(minutes: number): string {
  return `${Math.abs(minutes)} min ${minutes > 0 ? 'early' : 'late'}`;
}

function signed(minutes: number): string {
  if (minutes === 0) return '0';
  return minutes < 0 ? `−${-minutes}` : `+${minutes}`;
}

function altitudeDoubts(year: WeatherYear): string[] {
  const meanPa = year.pressurePa.reduce((sum, pa) => sum + pa, 0) / year.pressurePa.length;
  const altitudeM = standardAltitudeM(meanPa);
  if (Math.abs(altitudeM - year.altitudeM) <= ALTITUDE_TOLERANCE_M) return [];
  return [
    `The stated elevation is ${year.altitudeM.toFixed(0)} m, but the mean pressure of ${(meanPa / 100).toFixed(0)} hPa belongs to about ${altitudeM.toFixed(0)} m.`,
  ];
}

function beamDoubts(year: WeatherYear): string[] {
  let count = 0;
  let highest = 0;
  let highestAt = 0;
  year.dniWm2.forEach((dni, at) => {
    const start = new Date(year.startLocalMs[at]!);
    const dayOfYear = Math.floor((start.getTime() - Date.UTC(start.getUTCFullYear(), 0, 1)) / DAY_MS) + 1;
    if (dni <= extraterrestrialNormalWm2(dayOfYear)) return;
    count += 1;
    if (dni > highest) {
      highest = dni;
      highestAt = at;
    }
  });
  if (count === 0) return [];
  const when = new Date(year.startLocalMs[highestAt]!);
  return [
    `${count} ${count === 1 ? 'record has' : 'records have'} more beam than reaches the top of the atmosphere, at most ${highest.toFixed(0)} W/m² ` +
      `on ${when.getUTCDate()} ${MONTHS[when.getUTCMonth()]!}, record ${highestAt + 1}.`,
  ];
}

function zoneDoubts(year: WeatherYear): string[] {
  const solarHours = year.longitudeDeg / 15;
  const difference = ((year.utcOffsetHours - solarHours + 36) % 24) - 12;
  if (Math.abs(difference) <= ZONE_TOLERANCE_HOURS) return [];
  return [
    `The time zone UTC${year.utcOffsetHours < 0 ? '−' : '+'}${Math.abs(year.utcOffsetHours)} is ${Math.abs(difference).toFixed(1)} h from the sun's time at longitude ${year.longitudeDeg}°.`,
  ];
}
