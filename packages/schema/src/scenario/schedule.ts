import type { Schedule } from '@noonwell/engine';
import { INVENTED, numberField, numberListField } from '../field.js';

/** Weights of the 24 hours, a factor for weekends and one for each month: shared by every scheduled use. */
export function scheduleFields(what: string, hourly: readonly number[], weekend: number) {
  return {
    hourlyWeights: numberListField({
      label: `${what} by hour`,
      unit: '1',
      min: 0,
      max: 1000,
      length: 24,
      defaultValue: hourly,
      help: 'Weights of the hours from 0–1 to 23–24, local standard time; only their ratios count.',
      source: INVENTED,
    }),
    weekendFactor: numberField({
      label: 'Weekend factor',
      unit: '1',
      min: 0,
      max: 10,
      defaultValue: weekend,
      help: 'Saturday and Sunday against a working day.',
      source: INVENTED,
    }),
    monthFactors: numberListField({
      label: 'Month factors',
      unit: '1',
      min: 0,
      max: 10,
      length: 12,
      defaultValue: [1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1],
      help: 'January to December against the stated day.',
      source: INVENTED,
    }),
  };
}

export function toSchedule(fields: Schedule): Schedule {
  return {
    hourlyWeights: fields.hourlyWeights,
    weekendFactor: fields.weekendFactor,
    monthFactors: fields.monthFactors,
  };
}

export function sumOf(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
