import type { Schedule } from '../schedule.js';

export interface ElectricityUseSettings {
  /** Own use of the site in a year, without pump and tracker [J]. */
  readonly annualUseJ: number;
  readonly schedule: Schedule;
}
