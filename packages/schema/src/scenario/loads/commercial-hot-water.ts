import { z } from 'zod';
import { COMMON_PRACTICE, INVENTED, numberField } from '../../field.js';
import { scheduleFields, sumOf, toSchedule } from '../schedule.js';
import type { LoadDefinition } from './definition.js';

/** Cleaning water from six in the morning to two in the afternoon. */
const WORKING_MORNING = [0, 0, 0, 0, 0, 0, 1, 1, 1, 1, 1, 1, 1, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0];

export const commercialHotWaterSchema = z.strictObject({
  kind: z.literal('commercialHotWater'),
  litresPerDay: numberField({
    label: 'Hot water on a working day',
    unit: 'L',
    min: 0,
    max: 200_000,
    defaultValue: 1000,
    help: 'Litres at the supply temperature on a working day with month factor 1.',
    source: INVENTED,
  }),
  setPointC: numberField({
    label: 'Supply temperature',
    unit: '°C',
    min: 25,
    max: 95,
    defaultValue: 82,
    help: 'Hotter store water is mixed down with cold; colder is finished by the boiler.',
    source: INVENTED,
  }),
  ...scheduleFields('Hot water', WORKING_MORNING, 0.4),
  boilerCapacityKw: numberField({
    label: 'Boiler capacity',
    unit: 'kW',
    min: 0,
    max: 5000,
    defaultValue: 40,
    help: 'Greatest heat of the backup boiler; what it cannot give stays unmet.',
    source: INVENTED,
  }),
  boilerEfficiency: numberField({
    label: 'Boiler efficiency',
    unit: '1',
    min: 0.3,
    max: 1.1,
    defaultValue: 0.85,
    help: 'Heat over fuel energy.',
    source: COMMON_PRACTICE,
  }),
});

type Document = z.infer<typeof commercialHotWaterSchema>;

export const commercialHotWater: LoadDefinition<Document> = {
  toSettings: (document) => ({
    kind: 'commercialHotWater',
    volumePerDayM3: document.litresPerDay / 1000,
    setPointC: document.setPointC,
    schedule: toSchedule(document),
    boilerCapacityW: document.boilerCapacityKw * 1000,
    boilerEfficiency: document.boilerEfficiency,
  }),
  problems: (document, path, tankLitres) => {
    const total = sumOf(document.hourlyWeights);
    if (!(total > 0))
      return [{ path: `${path}.hourlyWeights`, message: 'At least one hour needs a weight above 0' }];
    const busiestDay = Math.max(...document.monthFactors) * Math.max(1, document.weekendFactor);
    const peakLitresPerMinute =
      (document.litresPerDay * busiestDay * Math.max(...document.hourlyWeights)) / total / 60;
    if (peakLitresPerMinute <= tankLitres) return [];
    const message =
      'The busiest hour would draw the whole tank within a minute: lower the draw or enlarge the tank';
    return [{ path: `${path}.litresPerDay`, message }];
  },
};
