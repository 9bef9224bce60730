import { meinelClearSkyBeamWm2 } from '../../src/sun/clear-sky.js';
import { emptySunPosition, sunPosition } from '../../src/sun/position.js';
import type { WeatherYear } from '../../src/weather-year.js';
import { uniformStream } from '../random.js';

export interface MadePlace {
  readonly days?: number;
  readonly latitudeDeg?: number;
  readonly meanC?: number;
  readonly windMs?: number;
  /** Share of days with cloud in front of the beam. */
  readonly cloudy?: number;
  readonly firstDay?: number;
}

/** A made-up hourly year: clear-sky beam thinned by seeded clouds, waves of temperature, gusty days. Same bytes every time. */
export function madeWeather(place: MadePlace = {}): WeatherYear {
  const { days = 365, latitudeDeg = 35, meanC = 15, windMs = 3, cloudy = 0.35, firstDay = 0 } = place;
  const random = uniformStream(7);
  const records = days * 24;
  const column = () => new Float64Array(records);
  const year = {
    latitudeDeg,
    longitudeDeg: -105,
    altitudeM: 600,
    utcOffsetHours: -7,
    intervalMinutes: 60,
    firstWeekday: 0,
    startLocalMs: column(),
    dniWm2: column(),
    ghiWm2: column(),
    dhiWm2: column(),
    dryBulbC: column(),
    windMs: column(),
    relativeHumidityPct: column().fill(50),
    pressurePa: column().fill(94_000),
    flags: new Uint16Array(records),
  };
  const sun = emptySunPosition();
  const midnightMs = Date.UTC(2021, 0, 1 + firstDay);
  for (let day = 0; day < days; day++) {
    const sky = random() < cloudy ? random() : 1;
    const gust = random() < 0.05 ? 14 : 0;
    for (let hour = 0; hour < 24; hour++) {
      const record = day * 24 + hour;
      const startMs = midnightMs + record * 3_600_000;
      year.startLocalMs[record] = startMs;
      sunPosition(
        startMs + 7 * 3_600_000 + 1_800_000,
        (latitudeDeg * Math.PI) / 180,
        (-105 * Math.PI) / 180,
        94_000,
        meanC,
        sun,
      );
      const sine = Math.max(0, Math.sin(sun.elevationRad));
      const dniWm2 = sky * meinelClearSkyBeamWm2(sun.elevationRad, 600);
      year.dniWm2[record] = dniWm2;
      year.dhiWm2[record] = 100 * sine;
      year.ghiWm2[record] = dniWm2 * sine + 100 * sine;
      const season = -Math.cos((2 * Math.PI * (day + firstDay)) / 365) * Math.sign(latitudeDeg || 1);
      year.dryBulbC[record] = meanC + 10 * season + 5 * Math.sin((2 * Math.PI * (hour - 9)) / 24);
      year.windMs[record] = hour > 9 && hour < 16 && gust > 0 ? gust : windMs * (0.5 + random());
    }
  }
  return year;
}
