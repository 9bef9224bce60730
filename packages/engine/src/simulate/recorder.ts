import { ACCOUNTS, type Account } from '../ledger/accounts.js';
import type { RecordCalendar } from '../calendar.js';
import { STATE_CHANNELS, type StateChannel } from './channels.js';
import type { HourlyColumns } from './result.js';

/** Keeps what a run gives record by record: mean powers, states, tank layers, and the sums by month and year. */
export class Recorder {
  /** Energies of the record now running [J], in the order of ACCOUNTS. */
  readonly recordJ = new Float64Array(ACCOUNTS.length);
  readonly yearJ = new Float64Array(ACCOUNTS.length);
  readonly monthlyJ = new Float64Array(12 * ACCOUNTS.length);
  readonly hourly: HourlyColumns;
  private readonly powers: Float64Array[];

  constructor(
    startLocalMs: Float64Array,
    private readonly calendar: RecordCalendar,
    private readonly intervalS: number,
    layers: number,
  ) {
    const records = startLocalMs.length;
    const column = () => new Float64Array(records);
    this.powers = ACCOUNTS.map(column);
    this.hourly = {
      startLocalMs: Float64Array.from(startLocalMs),
      powersW: Object.fromEntries(ACCOUNTS.map((account, index) => [account, this.powers[index]!])) as Record<
        Account,
        Float64Array
      >,
      states: Object.fromEntries(STATE_CHANNELS.map(({ key }) => [key, column()])) as Record<
        StateChannel,
        Float64Array
      >,
      tankLayersC: Array.from({ length: layers }, column),
    };
  }

  /** Takes the running record's energies into the columns and sums, and begins the next at zero. */
  close(record: number): void {
    const monthOffset = this.calendar.month[record]! * ACCOUNTS.length;
    for (let account = 0; account < ACCOUNTS.length; account++) {
      const energyJ = this.recordJ[account]!;
      this.powers[account]![record] = energyJ / this.intervalS;
      this.yearJ[account]! += energyJ;
      this.monthlyJ[monthOffset + account]! += energyJ;
    }
    this.recordJ.fill(0);
  }
}
