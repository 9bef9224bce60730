import type { Schedule } from '../schedule.js';

export interface CommercialHotWaterSettings {
  readonly kind: 'commercialHotWater';
  /** Water at the set point on a working day with month factor 1 [m³/day]. */
  readonly volumePerDayM3: number;
  readonly setPointC: number;
  readonly schedule: Schedule;
  /** Greatest heat of the backup boiler [W]. */
  readonly boilerCapacityW: number;
  /** Heat over fuel energy [1]. */
  readonly boilerEfficiency: number;
}
