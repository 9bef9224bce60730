import { scenarioFields } from '@noonwell/schema';
import { expect, it } from 'vitest';
import { headingOf, headingsOf } from './headings.js';

const headings = headingsOf(scenarioFields());

it('puts every field of the schema under a heading, once', () => {
  const placed = headings.flatMap(({ groups }) =>
    groups.flatMap(({ fields }) => fields.map(({ path }) => path)),
  );
  expect(placed.toSorted()).toEqual(
    scenarioFields()
      .map(({ path }) => path)
      .toSorted(),
  );
});

it('shows no heading without a field', () => {
  expect(headings.map(({ label }) => label)).toEqual(['Place', 'Catch', 'Carry and keep', 'Use']);
});

it('groups fields by the part of the machine', () => {
  expect(headings.map(({ groups }) => groups.map(({ label }) => label))).toEqual([
    ['Horizon', 'Simulation'],
    ['Dish', 'Tracker', 'Outages', 'Receiver'],
    ['Pump', 'Pipe', 'Tank'],
    ['Loads', 'Electricity'],
  ]);
});

it('finds the heading of a field', () => {
  expect(headingOf('use.loads.0.hourlyWeights.5')).toBe('use');
  expect(headingOf('simulation.stepMinutes')).toBe('place');
});
