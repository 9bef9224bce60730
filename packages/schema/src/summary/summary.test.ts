import { LEDGER_LINES, TRACKER_STATES } from '@noonwell/engine';
import { expect, it } from 'vitest';
import { runSummarySchema } from './summary.js';

const LATER = ['belowHorizonProfile', 'outOfService'];
const { trackerHours, ledger } = runSummarySchema.shape;
const filled = (keys: readonly string[], left: readonly string[] = []) =>
  Object.fromEntries(keys.filter((key) => !left.includes(key)).map((key) => [key, 1]));
const lineKeys = LEDGER_LINES.map(({ key }) => key);

it('reads a summary from before the horizon profile and outages: no time and no beam in them', () => {
  expect(trackerHours.parse(filled(TRACKER_STATES, LATER))).toEqual({
    ...filled(TRACKER_STATES),
    belowHorizonProfile: 0,
    outOfService: 0,
  });
  const lines = ledger.shape.lines.parse(filled(lineKeys, LATER));
  expect([lines.belowHorizonProfile, lines.outOfService, lines.nightPark]).toEqual([0, 0, 1]);
});

it('keeps what stands there, and refuses a summary without one of the other states or lines', () => {
  expect(trackerHours.parse(filled(TRACKER_STATES))).toEqual(filled(TRACKER_STATES));
  expect(trackerHours.safeParse(filled(TRACKER_STATES, ['tracking'])).success).toBe(false);
  expect(ledger.shape.lines.safeParse(filled(lineKeys, ['absorbed'])).success).toBe(false);
  expect(trackerHours.safeParse(null).success).toBe(false);
});
