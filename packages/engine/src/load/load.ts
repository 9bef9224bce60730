import type { TankStep } from '../store/stratified-tank.js';

/** What a load asks of the tank in a record, and how what is missing is supplied. */
export interface Load {
  /** Writes the draw of the given record into the tank's step. */
  ask(record: number, step: TankStep): void;
  /** Supplies what the solved step lacks [J]. */
  settle(step: TankStep): void;
  /** Results of the last settled step [J]. */
  readonly backupJ: number;
  readonly unmetJ: number;
  readonly fuelJ: number;
}
