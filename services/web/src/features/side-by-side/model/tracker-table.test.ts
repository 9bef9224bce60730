import { TRACKER_STATES } from '@noonwell/engine';
import { expect, it } from 'vitest';
import { summaryFixture } from './fixtures.js';
import { trackerTable } from './tracker-table.js';

const hours = Object.fromEntries(TRACKER_STATES.map((state, index) => [state, 100 + index])) as Record<
  (typeof TRACKER_STATES)[number],
  number
>;
// A beam of 1000 kWh: 100 at night, 60 behind the horizon, 40 in an outage; 800 are left for the sun.
const lines = {
  beamOnAperture: 1000,
  nightPark: 100,
  belowHorizonProfile: 60,
  outOfService: 40,
  absorbed: 800,
};
const rows = trackerTable([summaryFixture({ lines, summary: { trackerHours: hours } })]);
const row = (state: string) => rows.find((one) => one.state === state);

it('has each state once, the time on the sun first, with its hours', () => {
  expect(rows[0]).toMatchObject({ state: 'tracking', label: 'On the sun' });
  expect(rows.map(({ state }) => state).toSorted()).toEqual(TRACKER_STATES.toSorted());
  for (const { state, hours: shown } of rows) expect(shown).toEqual([hours[state]]);
});

it('gives each state its share of the beam; all of them are the whole', () => {
  expect(row('belowHorizonProfile')?.shareOfBeam[0]).toBeCloseTo(0.06, 12);
  expect(row('outOfService')?.shareOfBeam[0]).toBeCloseTo(0.04, 12);
  expect(row('tracking')?.shareOfBeam[0]).toBeCloseTo(0.8, 12);
  expect(rows.reduce((sum, { shareOfBeam }) => sum + (shareOfBeam[0] ?? NaN), 0)).toBeCloseTo(1, 12);
});

it('speaks in the words of the ledger', () => {
  expect(row('belowHorizonProfile')?.label).toBe('Sun behind the horizon profile');
  expect(row('outOfService')?.label).toBe('Scheduled outage');
});

it('has no share where there was no beam', () => {
  const dark = trackerTable([
    summaryFixture({
      lines: { beamOnAperture: 0, nightPark: 0 },
      summary: { heatToFluidOfBeam: 0, powerAcOfBeam: 0 },
    }),
  ]);
  expect(dark.every(({ shareOfBeam }) => shareOfBeam[0] === null)).toBe(true);
});
