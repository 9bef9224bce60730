import type { WeatherYear } from '@noonwell/engine';
import type { WeatherSummary } from '@noonwell/schema';

/**
 * Yearly and monthly figures of a weather year.
 *
 * @param year any length; months are those of local standard time
 * @returns sums of irradiance [kWh/m²] with values clipped at 0, means of temperature [°C] and wind [m/s]
 * Source: arithmetic; the sum of a record is its mean times its interval.
 */
export function summariseWeather(year: WeatherYear): WeatherSummary {
  const records = year.startLocalMs.length;
  const kwhPerWm2 = year.intervalMinutes / 60 / 1000;
  const monthlyDni = new Float64Array(12);
  const monthlyGhi = new Float64Array(12);
  const monthlyDhi = new Float64Array(12);
  const monthlyDryBulb = new Float64Array(12);
  const monthlyRecords = new Float64Array(12);
  let dryBulbMinC = Infinity;
  let dryBulbMaxC = -Infinity;
  let windMs = 0;
  let flaggedRecords = 0;

  for (let at = 0; at < records; at += 1) {
    const month = new Date(year.startLocalMs[at]!).getUTCMonth();
    monthlyDni[month]! += Math.max(0, year.dniWm2[at]!) * kwhPerWm2;
    monthlyGhi[month]! += Math.max(0, year.ghiWm2[at]!) * kwhPerWm2;
    monthlyDhi[month]! += Math.max(0, year.dhiWm2[at]!) * kwhPerWm2;
    const dryBulbC = year.dryBulbC[at]!;
    monthlyDryBulb[month]! += dryBulbC;
    monthlyRecords[month]! += 1;
    dryBulbMinC = Math.min(dryBulbMinC, dryBulbC);
    dryBulbMaxC = Math.max(dryBulbMaxC, dryBulbC);
    windMs += year.windMs[at]!;
    if (year.flags[at] !== 0) flaggedRecords += 1;
  }

  return {
    records,
    intervalMinutes: year.intervalMinutes,
    dniKwhM2: sum(monthlyDni),
    ghiKwhM2: sum(monthlyGhi),
    dhiKwhM2: sum(monthlyDhi),
    dryBulbMinC,
    dryBulbMaxC,
    dryBulbMeanC: sum(monthlyDryBulb) / records,
    windMeanMs: windMs / records,
    monthlyDniKwhM2: Array.from(monthlyDni),
    monthlyGhiKwhM2: Array.from(monthlyGhi),
    monthlyDryBulbMeanC: Array.from(
      monthlyDryBulb,
      (total, month) => total / Math.max(1, monthlyRecords[month]!),
    ),
    flaggedRecords,
  };
}

function sum(values: Float64Array): number {
  return values.reduce((total, value) => total + value, 0);
}
