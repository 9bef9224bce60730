import { MOST_SCENARIOS } from '@noonwell/schema';
import { CHANNEL_SET_KEYS, type ChannelSetKey } from './channel-sets.js';
import type { CalendarDay } from './weeks.js';

/** What the address holds, so that a link shows a colleague the same picture. */
export interface ViewState {
  /** Scenario that the others are held against; null: the study's first. */
  readonly baseline: string | null;
  /** Scenarios shown, in order; empty: all of the study's that have run. */
  readonly scenarios: readonly string[];
  /** Shown in the tables but not drawn. */
  readonly hidden: readonly string[];
  /** First day of the week looked at; null: the sunniest. */
  readonly week: CalendarDay | null;
  readonly channelSet: ChannelSetKey;
}

export const DEFAULT_VIEW: ViewState = {
  baseline: null,
  scenarios: [],
  hidden: [],
  week: null,
  channelSet: 'heat',
};

/** Raised when an old link would mean something else; a parser for each older version stays beside it. */
const VERSION = '1';
const KEY = {
  version: 'v',
  baseline: 'base',
  scenarios: 'with',
  hidden: 'hide',
  week: 'week',
  channelSet: 'hours',
} as const;
const ID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/** Reads an address's query. Whatever it holds, something is shown: what is not understood takes its default. */
export function parseView(query: string | URLSearchParams): ViewState {
  const parameters = typeof query === 'string' ? new URLSearchParams(query) : query;
  if ((parameters.get(KEY.version) ?? VERSION) !== VERSION) return DEFAULT_VIEW;
  const scenarios = ids(parameters.get(KEY.scenarios));
  const [baseline = null] = ids(parameters.get(KEY.baseline));
  return {
    baseline,
    scenarios,
    hidden: ids(parameters.get(KEY.hidden)),
    week: calendarDay(parameters.get(KEY.week)),
    channelSet:
      CHANNEL_SET_KEYS.find((key) => key === parameters.get(KEY.channelSet)) ?? DEFAULT_VIEW.channelSet,
  };
}

/** The query of a view: what has its default is left out, the version stands whenever anything does. */
export function serialiseView(view: ViewState): string {
  const parameters = new URLSearchParams();
  if (view.baseline !== null) parameters.set(KEY.baseline, view.baseline);
  if (view.scenarios.length > 0) parameters.set(KEY.scenarios, view.scenarios.join('~'));
  if (view.hidden.length > 0) parameters.set(KEY.hidden, view.hidden.join('~'));
  if (view.week !== null) parameters.set(KEY.week, view.week);
  if (view.channelSet !== DEFAULT_VIEW.channelSet) parameters.set(KEY.channelSet, view.channelSet);
  if (parameters.size > 0) parameters.set(KEY.version, VERSION);
  return parameters.toString();
}

function ids(text: string | null): string[] {
  const found = (text ?? '').split('~').filter((id) => ID.test(id));
  return [...new Set(found)].slice(0, MOST_SCENARIOS);
}

function calendarDay(text: string | null): CalendarDay | null {
  const match = /^(\d\d)-(\d\d)$/.exec(text ?? '');
  if (!match) return null;
  const [, month, day] = match.map(Number);
  // A leap year, so that 29 February is a day.
  const date = new Date(Date.UTC(2000, (month ?? 0) - 1, day));
  return date.toISOString().slice(5, 10) === text ? (text as CalendarDay) : null;
}
