import { z } from 'zod';
import { fieldRegistry, numberField } from '../field.js';

/** A pair a degree and no more: a survey has fewer, a table made from a terrain model as many. */
export const MOST_HORIZON_POINTS = 360;

const SURVEYED = 'survey of the place';

export const horizonPointSchema = z.strictObject({
  azimuthDeg: numberField({
    label: 'Azimuth',
    unit: '°',
    min: 0,
    max: 360,
    defaultValue: 0,
    help: 'Clockwise from north: 90 is east. 360 is north again.',
    source: SURVEYED,
  }),
  elevationDeg: numberField({
    label: 'Elevation',
    unit: '°',
    min: 0,
    max: 90,
    defaultValue: 0,
    help: 'Height of what stands in this direction, above the level, as seen from the dish.',
    source: SURVEYED,
  }),
});
export type HorizonPointDocument = z.infer<typeof horizonPointSchema>;

export const placeSchema = z.strictObject({
  horizon: z
    .array(horizonPointSchema)
    .max(MOST_HORIZON_POINTS, { error: `Horizon profile takes at most ${MOST_HORIZON_POINTS} pairs` })
    .register(fieldRegistry, {
      label: 'Horizon profile',
      unit: '',
      help: 'What hides the sun around the dish: hills, trees, buildings. Straight lines between the pairs, on through north from the last to the first. One pair is the same height all round; none is a level horizon.',
      source: SURVEYED,
      defaultValue: [],
      mostRows: MOST_HORIZON_POINTS,
    }),
});
