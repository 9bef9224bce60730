import type { ElectricityUseSettings } from './electricity/use.js';
import type { LoadSettings } from './load/registry.js';
import type { LoopSettings } from './loop/loop.js';
import type { DishSettings } from './optics/dish.js';
import type { HorizonPoint } from './place/horizon.js';
import type { ReceiverSettings } from './receivers/registry.js';
import type { TankSettings } from './store/stratified-tank.js';
import type { Outage } from './tracker/outage.js';
import type { TrackerSettings } from './tracker/tracker.js';

/** The whole machine with its loads, in SI units, radians and °C: what a run needs besides the weather. */
export interface Machine {
  readonly place: {
    /** Profile of what stands around the dish, in any order; none is a level horizon. */
    readonly horizon: readonly HorizonPoint[];
  };
  readonly dish: DishSettings;
  readonly tracker: TrackerSettings;
  /** Days on which the dish is out of service, every year. */
  readonly outages: readonly Outage[];
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
