import type { WeatherYear } from '@noonwell/engine';
import { standardPressurePa } from '../atmosphere.js';
import { isLeapYear, slotStartLocalMs } from '../calendar.js';
import { EPW_COLUMNS } from '../epw/columns.js';
import { hourIrradiance, type HourIrradiance } from './irradiance.js';
import type { SyntheticPlace } from './place.js';
import { correlatedNormals, createRandom } from './random.js';

/** Day on which the northern year is coldest; half a year later in the south (common practice, no source). */
const COLDEST_DAY = 20;
const WARMEST_HOUR = 15;
const HOUR_TO_HOUR_CLOUD = 0.8;
const HOUR_TO_HOUR_WIND = 0.9;
const HOURLY_COVER_SPREAD = 0.8;
const HIGHEST_WIND_MS = 30;

/**
 * An invented weather year of hourly records: the same place and seed give the same values every time.
 * Every value is rounded to the digits of an EPW file, so that writing it to one and reading it back is exact.
 *
 * @param place checked descriptor of an invented place
 * @returns a whole calendar year; GHI closes with DHI + DNI cos z
 */
export function generateSyntheticYear(place: SyntheticPlace): WeatherYear {
  const { climate } = place;
  const days = isLeapYear(place.calendarYear) ? 366 : 365;
  const hours = days * 24;
  const random = createRandom(place.seed);
  const dayCover = correlatedNormals(random, days + 1, climate.dayToDay);
  const dayDryBulb = correlatedNormals(random, days + 1, climate.dayToDay);
  const dayPressure = correlatedNormals(random, days + 1, climate.dayToDay);
  const hourCover = correlatedNormals(random, hours, HOUR_TO_HOUR_CLOUD);
  const hourWind = correlatedNormals(random, hours, HOUR_TO_HOUR_WIND);
  const meanPressurePa = standardPressurePa(place.altitudeM);
  const coldestDay = place.latitudeDeg >= 0 ? COLDEST_DAY : COLDEST_DAY + 182.5;
  const firstStart = new Date(Date.UTC(place.calendarYear, 0, 1));

  const column = () => new Float64Array(hours);
  const year = {
    latitudeDeg: place.latitudeDeg,
    longitudeDeg: place.longitudeDeg,
    altitudeM: place.altitudeM,
    utcOffsetHours: place.utcOffsetHours,
    intervalMinutes: 60,
    firstWeekday: (firstStart.getUTCDay() + 6) % 7,
    startLocalMs: column(),
    dniWm2: column(),
    ghiWm2: column(),
    dhiWm2: column(),
    dryBulbC: column(),
    windMs: column(),
    relativeHumidityPct: column(),
    pressurePa: column(),
    flags: new Uint16Array(hours),
  };
  const irradiance: HourIrradiance = { dniWm2: 0, ghiWm2: 0, dhiWm2: 0 };

  for (let at = 0; at < hours; at += 1) {
    const day = Math.floor(at / 24);
    const ofDay = (at % 24) + 0.5;
    const season = Math.cos((2 * Math.PI * (day - coldestDay)) / 365.25);
    const afternoon = Math.cos((2 * Math.PI * (ofDay - WARMEST_HOUR)) / 24);
    const usualCover =
      (climate.coverSummer + climate.coverWinter) / 2 +
      ((climate.coverWinter - climate.coverSummer) / 2) * season;
    const coverToday = logistic(logit(usualCover) + climate.coverSpread * dayCover[day]!);
    const cover = logistic(
      logit(usualCover) + climate.coverSpread * dayCover[day]! + HOURLY_COVER_SPREAD * hourCover[at]!,
    );
    const brightness = 1 - coverToday;

    const dayMeanC =
      climate.dryBulbMeanC -
      climate.dryBulbAnnualC * season +
      climate.dryBulbSpreadC * between(dayDryBulb, day, ofDay);
    const dryBulbC = dayMeanC + climate.dryBulbDailyC * (0.3 + 0.7 * brightness) * afternoon;
    const dewPointC = Math.min(dryBulbC, dayMeanC - climate.dewPointDepressionC * (0.3 + 0.7 * brightness));
    const pressurePa = meanPressurePa + climate.pressureSpreadPa * between(dayPressure, day, ofDay);
    const windMs =
      climate.windMeanMs *
      (1 + climate.windDaily * afternoon) *
      Math.exp(climate.windSpread * hourWind[at]! - climate.windSpread ** 2 / 2);

    const startLocalMs = slotStartLocalMs(
      place.calendarYear,
      isLeapYear(place.calendarYear) || day < 59 ? at : at + 24,
    );
    hourIrradiance(
      { ...place, pressurePa },
      startLocalMs - place.utcOffsetHours * 3_600_000,
      day + 1,
      dryBulbC,
      cover,
      climate.clearBeamFactor,
      irradiance,
    );
    year.startLocalMs[at] = startLocalMs;
    year.dniWm2[at] = irradiance.dniWm2;
    year.ghiWm2[at] = irradiance.ghiWm2;
    year.dhiWm2[at] = irradiance.dhiWm2;
    year.dryBulbC[at] = dryBulbC;
    year.windMs[at] = Math.min(HIGHEST_WIND_MS, windMs);
    year.relativeHumidityPct[at] = 100 * (vapourPressure(dewPointC) / vapourPressure(dryBulbC));
    year.pressurePa[at] = pressurePa;
  }
  for (const { channel, digits } of EPW_COLUMNS) roundColumn(year[channel], digits);
  return year;
}

/** A day's value drawn over to the next day's, so that midnight makes no jump. */
function between(dayValues: Float64Array, day: number, hourOfDay: number): number {
  const share = hourOfDay / 24;
  return dayValues[day]! * (1 - share) + dayValues[day + 1]! * share;
}

function logit(share: number): number {
  return Math.log(share / (1 - share));
}

function logistic(value: number): number {
  return 1 / (1 + Math.exp(-value));
}

/** Saturation pressure over water [hPa]. Source: Alduchov & Eskridge 1996, J. Appl. Meteorol. 35:601, eq. 21 (coefficients from memory). */
function vapourPressure(temperatureC: number): number {
  return 6.1094 * Math.exp((17.625 * temperatureC) / (temperatureC + 243.04));
}

function roundColumn(column: Float64Array, digits: number): void {
  const scale = 10 ** digits;
  // Adding 0 turns −0 into 0.
  for (let at = 0; at < column.length; at += 1) column[at] = Math.round(column[at]! * scale) / scale + 0;
}
