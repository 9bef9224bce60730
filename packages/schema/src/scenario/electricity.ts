import { z } from 'zod';
import { INVENTED, numberField } from '../field.js';
import { scheduleFields } from './schedule.js';

const DAYTIME = [2, 2, 2, 2, 2, 3, 5, 6, 6, 6, 6, 6, 6, 6, 5, 4, 4, 3, 3, 3, 2, 2, 2, 2];

export const electricityUseSchema = z.strictObject({
  annualUseKwh: numberField({
    label: 'Electricity use in a year',
    unit: 'kWh',
    min: 0,
    max: 10_000_000,
    defaultValue: 12_000,
    help: 'Own use at the site without pump and tracker. Power from the dish meets it first; the rest is exported.',
    source: INVENTED,
  }),
  ...scheduleFields('Electricity', DAYTIME, 0.6),
});
