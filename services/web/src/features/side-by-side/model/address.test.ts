import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MOST_SCENARIOS } from '@noonwell/schema';
import { DEFAULT_VIEW, parseView, serialiseView, type ViewState } from './address.js';
import { CHANNEL_SET_KEYS } from './channel-sets.js';
import { calendarDay } from './weeks.js';

const ids = (count: number) => fc.uniqueArray(fc.uuid(), { maxLength: count });
const views: fc.Arbitrary<ViewState> = fc.record({
  baseline: fc.option(fc.uuid()),
  scenarios: ids(MOST_SCENARIOS),
  hidden: ids(MOST_SCENARIOS),
  week: fc.option(fc.integer({ min: 0, max: 365 }).map((day) => calendarDay(Date.UTC(2000, 0, 1 + day)))),
  channelSet: fc.constantFrom(...CHANNEL_SET_KEYS),
});

describe('the address holds the view', () => {
  it('comes back as it was written', () => {
    fc.assert(
      fc.property(views, (view) => {
        expect(parseView(serialiseView(view))).toEqual(view);
      }),
    );
  });

  it('reads anything without throwing, and gives a view that can be written again', () => {
    const parameters = fc
      .array(
        fc.tuple(
          fc.constantFrom('v', 'base', 'with', 'hide', 'week', 'hours'),
          fc.string({ unit: 'binary' }),
        ),
      )
      .map((pairs) => new URLSearchParams(pairs).toString());
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary' }), parameters), (query) => {
        const view = parseView(query);
        expect(parseView(serialiseView(view))).toEqual(view);
      }),
    );
  });

  it('leaves an untouched page without a query', () => {
    expect(serialiseView(DEFAULT_VIEW)).toBe('');
    expect(parseView('')).toEqual(DEFAULT_VIEW);
  });

  it('names its version, and shows the default of one it does not know', () => {
    const query = serialiseView({ ...DEFAULT_VIEW, week: '06-21' });
    expect(query).toContain('v=1');
    expect(parseView(query.replace('v=1', 'v=99'))).toEqual(DEFAULT_VIEW);
  });

  it('drops a day that no calendar has', () => {
    expect(parseView('week=02-30').week).toBeNull();
    expect(parseView('week=13-01').week).toBeNull();
    expect(parseView('week=02-29').week).toBe('02-29');
  });
});
