import {
  LEDGER_LINES,
  TRACKER_STATES,
  type LedgerDirection,
  type LedgerLine,
  type LedgerPart,
  type TrackerState,
} from '@noonwell/engine';
import type { RunSummary } from '@noonwell/schema';

export interface TrackerRow {
  readonly state: TrackerState;
  readonly label: string;
  /** One a scenario [h]. */
  readonly hours: readonly number[];
  /** Of the beam on the aperture met in this state, one a scenario [1]; null where there was no beam. */
  readonly shareOfBeam: readonly (number | null)[];
}

const LABELS = new Map<string, string>(LEDGER_LINES.map(({ key, label }) => [key, label]));

/** Where the beam goes that is met on the sun: the state has no line of its own, but shadow, mirror and receiver have. */
const LINES_ON_THE_SUN: readonly LedgerLine[] = LEDGER_LINES.filter(
  ({ key, parts }) =>
    (parts as Partial<Record<LedgerPart, LedgerDirection>>).dish === 'out' &&
    !(TRACKER_STATES as readonly string[]).includes(key),
).map(({ key }) => key);

/** Hours in each state of the tracker and the share of the beam met in it; the shares of a dish that balances add up to 1. */
export function trackerTable(summaries: readonly RunSummary[]): TrackerRow[] {
  return TRACKER_STATES.map((state) => ({
    state,
    label: labelOf(state),
    hours: summaries.map(({ trackerHours }) => trackerHours[state]),
    shareOfBeam: summaries.map((summary) => shareOf(state, summary)),
  })).toSorted((one, other) => rank(one.state) - rank(other.state));
}

/** In the order in which the ledger takes them off the beam, the time on the sun first. */
function rank(state: TrackerState): number {
  return LEDGER_LINES.findIndex(({ key }) => key === state);
}

/** The ledger's words for its line, without its "Not collected". */
function labelOf(state: TrackerState): string {
  const words = (LABELS.get(state) ?? 'On the sun').replace(/^Not collected: /, '');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

function shareOf(state: TrackerState, { ledger: { lines } }: RunSummary): number | null {
  const beam = lines.beamOnAperture;
  if (!(beam > 0)) return null;
  const met: readonly LedgerLine[] = state === 'tracking' ? LINES_ON_THE_SUN : [state];
  return met.reduce((sum, line) => sum + lines[line], 0) / beam;
}
