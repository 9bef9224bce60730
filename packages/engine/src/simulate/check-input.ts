import { DomainError, requireRange } from '../errors.js';
import type { Machine } from '../machine.js';
import { WEATHER_CHANNEL_RANGE, WEATHER_CHANNELS, type WeatherYear } from '../weather-year.js';

/** @throws DomainError for a weather year with missing or impossible values */
export function requireWeather(weather: WeatherYear): void {
  requireRange('latitude [°]', weather.latitudeDeg, -90, 90);
  requireRange('longitude [°]', weather.longitudeDeg, -180, 180);
  requireRange('UTC offset [h]', weather.utcOffsetHours, -14, 14);
  requireRange('first weekday', weather.firstWeekday, 0, 6);
  const records = weather.startLocalMs.length;
  requireRange('weather records', records, 1, 1_000_000);
  for (const channel of WEATHER_CHANNELS) {
    const values = weather[channel];
    if (values.length !== records)
      throw new DomainError(`${channel} records`, values.length, String(records));
    const [low, high] = WEATHER_CHANNEL_RANGE[channel];
    for (let record = 0; record < records; record++) {
      requireRange(`${channel} in weather record ${record + 1}`, values[record]!, low, high);
    }
  }
}

/**
 * Sub-steps in a weather record.
 * @throws DomainError unless a whole number of steps fills the record
 */
export function stepsPerRecord(machine: Machine, weather: WeatherYear): number {
  const steps = (weather.intervalMinutes * 60) / machine.stepS;
  if (!(Number.isInteger(steps) && steps >= 1 && steps <= 3600)) {
    throw new DomainError(
      'step [min]',
      machine.stepS / 60,
      `a whole number of steps in the weather's ${weather.intervalMinutes} min`,
    );
  }
  return steps;
}
