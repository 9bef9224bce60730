import type { RecordCalendar } from '../calendar.js';
import { requireRange } from '../errors.js';
import { hourlyShares, type Schedule } from '../schedule.js';
import type { DrawPolicy, TankStep } from '../store/stratified-tank.js';
import { waterDensityKgM3 } from '../water/water.js';
import type { Load } from './load.js';

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

/**
 * Commercial hot water: litres an hour by schedule at one supply temperature, made up at mains temperature.
 * Store water hotter than that is mixed down; colder is finished by the boiler up to its capacity.
 */
export class CommercialHotWater implements Load {
  backupJ = 0;
  unmetJ = 0;
  fuelJ = 0;
  private readonly flowKgS: Float64Array;
  private readonly draw: { -readonly [Key in keyof DrawPolicy]: DrawPolicy[Key] };

  constructor(
    private readonly settings: CommercialHotWaterSettings,
    private readonly calendar: RecordCalendar,
    private readonly mainsC: (dayOfYear: number) => number,
  ) {
    requireRange('hot water [m³/day]', settings.volumePerDayM3, 0, 1e6);
    requireRange('boiler efficiency', settings.boilerEfficiency, 0.01, 2);
    requireRange('boiler capacity [W]', settings.boilerCapacityW, 0, 1e9);
    const kgPerHour = settings.volumePerDayM3 * waterDensityKgM3(settings.setPointC);
    this.flowKgS = hourlyShares(settings.schedule, calendar).map((share) => (share * kgPerHour) / 3600);
    this.draw = { loadFlowKgS: 0, setPointC: settings.setPointC, mainsC: 0 };
  }

  ask(record: number, step: TankStep): void {
    const flowKgS = this.flowKgS[record]!;
    if (!(flowKgS > 0)) {
      step.draw = null;
      return;
    }
    this.draw.loadFlowKgS = flowKgS;
    // Mains water that is already hot enough needs no heat: it is taken as it comes.
    this.draw.mainsC = Math.min(this.mainsC(this.calendar.dayOfYear[record]!), this.settings.setPointC);
    step.draw = this.draw;
  }

  settle(step: TankStep): void {
    const capacityJ = this.settings.boilerCapacityW * step.dtS;
    this.backupJ = Math.min(step.shortfallJ, capacityJ);
    this.unmetJ = Math.max(0, step.shortfallJ - capacityJ);
    this.fuelJ = this.backupJ / this.settings.boilerEfficiency;
  }
}
