import type { ElectricityUseSettings } from './electricity/use.js';
import type { LoadSettings } from './load/registry.js';
import type { LoopSettings } from './loop/loop.js';
import type { DishSettings } from './optics/dish.js';
import type { ReceiverSettings } from './receivers/registry.js';
import type { TankSettings } from './store/stratified-tank.js';
import type { TrackerSettings } from './tracker/tracker.js';

/** The whole machine with its loads, in SI units, radians and °C: what a run needs besides the weather. */
export interface Machine {
  readonly dish: DishSettings;
  readonly tracker: TrackerSettings;
  readonly trackerPower: { readonly standbyW: number; readonly movingW: number };
  readonly receiver: ReceiverSettings;
  readonly loop: LoopSettings;
  readonly tank: TankSettings;
  readonly store: {
    readonly initialC: number;
    /** The dish turns off the sun when the top layer reaches this [°C] … */
    readonly topLimitC: number;
    /** … and returns when it has fallen by this [K]. */
    readonly topHysteresisK: number;
  };
  readonly load: LoadSettings;
  readonly electricityUse: ElectricityUseSettings;
  readonly stepS: number;
}
