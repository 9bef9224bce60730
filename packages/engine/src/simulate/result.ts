import type { Account } from '../ledger/accounts.js';
import type { TrackerState } from '../tracker/states.js';
import type { StateChannel } from './channels.js';

/** What a run gives: SI and °C, energies in joules. All of it is a function of machine, weather and model version. */
export interface RunResult {
  readonly modelVersion: string;
  readonly stepS: number;
  readonly intervalS: number;
  readonly records: number;
  readonly weather: {
    readonly latitudeDeg: number;
    readonly longitudeDeg: number;
    readonly altitudeM: number;
    /** Beam on a surface that faces the sun, over the run [J/m²]. */
    readonly dniJm2: number;
    readonly dryBulbMeanC: number;
  };
  readonly apertureAreaM2: number;
  readonly rimAngleRad: number;
  readonly interceptFactor: number;
  readonly geometricConcentration: number;
  /** Every account over the run [J], in the order of ACCOUNTS (the ledger first). */
  readonly accountsJ: Float64Array;
  /** The same by calendar month: 12 rows of ACCOUNTS.length. */
  readonly monthlyAccountsJ: Float64Array;
  readonly trackerSeconds: Readonly<Record<TrackerState, number>>;
  readonly pumpSeconds: number;
  readonly pipeFreezeSeconds: number;
  readonly faceMaxC: number;
  readonly cellMaxC: number | null;
  readonly tankTopMaxC: number;
  readonly outletMaxC: number;
  readonly hourly: HourlyColumns;
}

/** One entry a weather record. */
export interface HourlyColumns {
  readonly startLocalMs: Float64Array;
  /** Mean power of each account over the record [W]. */
  readonly powersW: Readonly<Record<Account, Float64Array>>;
  readonly states: Readonly<Record<StateChannel, Float64Array>>;
  /** Layers from bottom to top at the end of the record [°C]. */
  readonly tankLayersC: readonly Float64Array[];
}
