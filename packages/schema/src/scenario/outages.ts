import { z } from 'zod';
import { fieldRegistry } from '../field.js';

export const MOST_OUTAGES = 12;

/** Most days of each month; 29 February counts in the years that have it. */
const MONTH_DAYS = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

/** A day of every year as the document writes it: "03-01" is 1 March. Null for a day that no year has. */
export function readMonthDay(text: string): { readonly month: number; readonly day: number } | null {
  const [, month, day] = /^(\d{2})-(\d{2})$/.exec(text)?.map(Number) ?? [];
  if (month === undefined || day === undefined) return null;
  const days = MONTH_DAYS[month - 1];
  return days !== undefined && day >= 1 && day <= days ? { month, day } : null;
}

function monthDayField(meta: { label: string; defaultValue: string; help: string }) {
  return z
    .string({ error: `${meta.label} must be a month and a day, as in 03-01 for 1 March` })
    .refine((text) => readMonthDay(text) !== null, {
      error: `${meta.label} must be a month and a day that exist, as in 03-01 for 1 March`,
    })
    .register(fieldRegistry, { ...meta, unit: '', source: 'plan of the operator' });
}

export const outageSchema = z.strictObject({
  from: monthDayField({
    label: 'First day',
    defaultValue: '01-01',
    help: 'Month and day; out from midnight on.',
  }),
  to: monthDayField({
    label: 'Last day',
    defaultValue: '01-01',
    help: 'Month and day, itself still out. Before the first day in the calendar, it lies in the next year.',
  }),
});
export type OutageDocument = z.infer<typeof outageSchema>;

export const outagesSchema = z
  .array(outageSchema)
  .max(MOST_OUTAGES, { error: `Scheduled outages are at most ${MOST_OUTAGES}` })
  .register(fieldRegistry, {
    label: 'Scheduled outages',
    unit: '',
    help: 'Days on which the dish is out of service every year, for maintenance. It stays parked, by day and by night; controller, tank and load go on.',
    source: 'plan of the operator',
    defaultValue: [],
    mostRows: MOST_OUTAGES,
  });
