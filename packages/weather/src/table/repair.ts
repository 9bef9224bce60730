import {
  extraterrestrialNormalWm2,
  sunPosition,
  WEATHER_CHANNELS,
  WEATHER_FLAG,
  type SunPosition,
  type WeatherChannel,
  type WeatherYear,
} from '@noonwell/engine';
import { standardPressurePa } from '../atmosphere.js';
import { fillGap, findGaps, LONGEST_FILLED_GAP_HOURS, type Gap } from '../gaps.js';
import type { ProblemList } from '../problem.js';
import { CHANNEL_NAMES, FILLED_FLAG, IRRADIANCE_CHANNELS, isIrradiance } from './channels.js';
import { labelText } from './time.js';

/** Repaired daylight records above this share are refused. Source: project rule, model section 2. */
const MOST_REPAIRED_DAYLIGHT = 0.05;
/** Mean cosine of the zenith angle below which a clearness index says nothing (own choice; about 1° of height). */
const LEAST_COS_ZENITH = 0.02;
const SUN_STEPS = 6;
const RAD_PER_DEG = Math.PI / 180;
const DAY_MS = 86_400_000;
const sun: SunPosition = { elevationRad: 0, azimuthRad: 0, trueElevationRad: 0 };

/** Where the missing value of a record stands in the file, for messages. */
export type PlaceOfRecord = (
  record: number,
  channel: WeatherChannel,
) => { line: number | null; column: number | null; columnName: string };

/**
 * Fills gaps of up to 3 h in place and marks them: irradiance by its clearness index, the rest by a straight
 * line; pressure that is missing longer follows from the altitude. Longer gaps are refused.
 * Source: project rule, model section 2; the clearness index after Liu & Jordan 1960, Solar Energy 4(3):1.
 */
export function repairGaps(
  year: WeatherYear,
  place: PlaceOfRecord,
  notes: string[],
  problems: ProblemList,
): void {
  for (const channel of WEATHER_CHANNELS) {
    for (const gap of findGaps(year[channel])) {
      const hours = ((gap.to - gap.from) * year.intervalMinutes) / 60;
      if (hours > LONGEST_FILLED_GAP_HOURS) {
        if (channel !== 'pressurePa') refuseGap(year, channel, gap, hours, place, problems);
        continue;
      }
      if (isIrradiance(channel)) fillByClearness(year, channel, gap);
      else fillGap(year[channel], gap);
      for (let at = gap.from; at < gap.to; at += 1) year.flags[at]! |= WEATHER_FLAG[FILLED_FLAG[channel]];
    }
  }
  pressureFromAltitude(year);
  refuseTooManyRepairs(year, problems);
  noteRepairs(year, notes);
}

function refuseGap(
  year: WeatherYear,
  channel: WeatherChannel,
  gap: Gap,
  hours: number,
  place: PlaceOfRecord,
  problems: ProblemList,
): void {
  const [from, to] = [gap.from, gap.to - 1].map((at) => labelText(year.startLocalMs[at]!).slice(5));
  problems.add({
    ...place(gap.from, channel),
    reason: `The ${CHANNEL_NAMES[channel]} is missing for ${Number(hours.toFixed(1))} hours: the records that start from ${from} to ${to}, local standard time.`,
    fix: `Gaps of at most ${LONGEST_FILLED_GAP_HOURS} hours are filled: give values for longer ones.`,
  });
}

/**
 * Fills a gap of irradiance: its ratio to the extraterrestrial irradiance (on the horizontal for GHI and DHI,
 * normal for DNI) runs in a straight line between the neighbours that have daylight. Where the three close
 * at both neighbours, what is filled closes as well.
 */
function fillByClearness(year: WeatherYear, channel: WeatherChannel, gap: Gap): void {
  const values = year[channel];
  const indexAt = (at: number): number | null => {
    const value = values[at];
    if (value === undefined || Number.isNaN(value)) return null;
    const available = availableWm2(year, channel, at);
    return available === null ? null : Math.min(1, value / available);
  };
  const left = indexAt(gap.from - 1);
  const right = indexAt(gap.to);
  const steps = gap.to - gap.from + 1;
  for (let at = gap.from; at < gap.to; at += 1) {
    const share = (at - gap.from + 1) / steps;
    const from = left ?? right ?? 0;
    const index = from + ((right ?? from) - from) * share;
    values[at] = index * (availableWm2(year, channel, at) ?? 0);
  }
}

/** Extraterrestrial irradiance over a record, the mean for a horizontal plane or normal to the sun; null with the sun down. */
function availableWm2(year: WeatherYear, channel: WeatherChannel, at: number): number | null {
  const cosZenith = meanCosZenith(year, at);
  if (cosZenith < LEAST_COS_ZENITH) return null;
  const start = year.startLocalMs[at]!;
  const dayOfYear = Math.floor((start - Date.UTC(new Date(start).getUTCFullYear(), 0, 1)) / DAY_MS) + 1;
  return extraterrestrialNormalWm2(dayOfYear) * (channel === 'dniWm2' ? 1 : cosZenith);
}

/** Mean of the cosine of the zenith angle over a record, 0 with the sun down. */
function meanCosZenith(year: WeatherYear, at: number): number {
  const startUtcMs = year.startLocalMs[at]! - year.utcOffsetHours * 3_600_000;
  const pressurePa = standardPressurePa(year.altitudeM);
  let total = 0;
  for (let step = 0; step < SUN_STEPS; step += 1) {
    const utcMs = startUtcMs + ((step + 0.5) / SUN_STEPS) * year.intervalMinutes * 60_000;
    // Refraction at an everyday temperature: the record's own may be the one that is missing.
    sunPosition(utcMs, year.latitudeDeg * RAD_PER_DEG, year.longitudeDeg * RAD_PER_DEG, pressurePa, 15, sun);
    total += Math.max(0, Math.sin(sun.elevationRad));
  }
  return total / SUN_STEPS;
}

function pressureFromAltitude(year: WeatherYear): void {
  const pressurePa = standardPressurePa(year.altitudeM);
  year.pressurePa.forEach((value, at) => {
    if (!Number.isNaN(value)) return;
    year.pressurePa[at] = pressurePa;
    year.flags[at]! |= WEATHER_FLAG.pressureFromAltitude;
  });
}

function refuseTooManyRepairs(year: WeatherYear, problems: ProblemList): void {
  const flagged = countFlag(year, WEATHER_FLAG.filledIrradiance);
  if (flagged === 0) return;
  let daylight = 0;
  let repaired = 0;
  year.flags.forEach((flags, at) => {
    if (meanCosZenith(year, at) === 0) return;
    daylight += 1;
    if ((flags & WEATHER_FLAG.filledIrradiance) !== 0) repaired += 1;
  });
  if (repaired <= MOST_REPAIRED_DAYLIGHT * daylight) return;
  problems.add({
    reason: `${repaired} of ${daylight} daylight records lack irradiance, which is ${((100 * repaired) / daylight).toFixed(1)} %.`,
    fix: `At most ${100 * MOST_REPAIRED_DAYLIGHT} % are filled: give a more complete year.`,
  });
}

function countFlag(year: WeatherYear, flag: number): number {
  return year.flags.reduce((count, flags) => count + ((flags & flag) === 0 ? 0 : 1), 0);
}

function noteRepairs(year: WeatherYear, notes: string[]): void {
  const note = (flag: number, sentence: (count: number) => string) => {
    const count = countFlag(year, flag);
    if (count > 0) notes.push(sentence(count));
  };
  const irradiances = IRRADIANCE_CHANNELS.length;
  note(
    WEATHER_FLAG.filledIrradiance,
    (count) =>
      `In ${count} records one or more of the ${irradiances} irradiances were filled by the clearness index of their neighbours (Liu & Jordan 1960).`,
  );
  for (const channel of ['dryBulbC', 'windMs', 'relativeHumidityPct', 'pressurePa'] as const) {
    note(
      WEATHER_FLAG[FILLED_FLAG[channel]],
      (count) =>
        `In ${count} records the ${CHANNEL_NAMES[channel]} was filled by a straight line between its neighbours.`,
    );
  }
  note(
    WEATHER_FLAG.pressureFromAltitude,
    (count) =>
      `${count} records without pressure got the standard atmosphere's at the site's altitude (ISO 2533).`,
  );
  note(
    WEATHER_FLAG.clippedIrradiance,
    (count) => `${count} records with irradiance just under 0 were set to 0.`,
  );
  note(
    WEATHER_FLAG.clippedHumidity,
    (count) => `${count} records with a humidity over 100 % were taken as 100 %.`,
  );
}
