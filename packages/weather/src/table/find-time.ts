import type { TableDateOrder } from '@noonwell/schema';
import { visitRows } from './blocks.js';
import { findTimePart } from './headings.js';
import type { TableLayout } from './layout.js';
import { DateOrderEvidence, looksLikeStamp, looksLikeTimeOfDay, readLabel, type TimeLayout } from './time.js';

/** Share of sampled cells that must agree before a column is taken for the time (own choice: damage is rare). */
const AGREEING_SHARE = 0.9;

/** The columns that hold the time stamp; null where none do. */
export function findTimeLayout({ sample, headings }: TableLayout): TimeLayout | null {
  const mostly = (holds: (row: readonly string[]) => boolean) =>
    sample.filter(holds).length >= AGREEING_SHARE * sample.length;
  const columns = headings.map((_, at) => at);
  const stamp = columns.find((at) => mostly((row) => looksLikeStamp(row[at] ?? '') === 'dateTime'));
  const date = columns.find((at) => mostly((row) => looksLikeStamp(row[at] ?? '') !== 'no'));
  const time = columns.find(
    (at) => date !== undefined && at === date + 1 && mostly((row) => looksLikeTimeOfDay(row[at] ?? '')),
  );
  const parts = {
    year: findTimePart(headings, 'year'),
    month: findTimePart(headings, 'month'),
    day: findTimePart(headings, 'day'),
    hour: findTimePart(headings, 'hour'),
  };
  // A date column whose cells all say midnight, with the time beside it, is a date and a time.
  const allMidnight =
    stamp !== undefined && mostly((row) => /[ T]0{1,2}:00(?::00)?$/.test((row[stamp] ?? '').trim()));
  if (stamp !== undefined && !(allMidnight && time !== undefined)) return { kind: 'stamp', column: stamp };
  if (date !== undefined && time !== undefined) return { kind: 'dateAndTime', date, time };
  if (Object.values(parts).every((at) => at >= 0)) {
    return { kind: 'parts', ...parts, minute: findTimePart(headings, 'minute') };
  }
  return date === undefined ? null : { kind: 'stamp', column: date };
}

/** Order of day, month and year; null where the whole file leaves it open. */
export function findDateOrder(
  bytes: Uint8Array,
  layout: TableLayout,
  time: TimeLayout,
): TableDateOrder | null {
  if (time.kind === 'parts') return 'yearFirst';
  const column = time.kind === 'stamp' ? time.column : time.date;
  const evidence = new DateOrderEvidence();
  for (const row of layout.sample) evidence.see(row[column] ?? '');
  if (evidence.order !== null) return evidence.order;
  visitRows({ bytes, ...layout }, (cells, line) => {
    if (line >= layout.firstDataLine) evidence.see(cells[column] ?? '');
    return evidence.order === null;
  });
  return evidence.order;
}

/** Whether a sampled label carries "Z" or an offset from UTC. */
export function labelsStateOffset({ sample }: TableLayout, time: TimeLayout, order: TableDateOrder): boolean {
  return sample.some((row) => readLabel(row, time, order)?.statesOffset === true);
}

/** The commonest step from one label to the next [min]; null where no two can be read. */
export function findIntervalMinutes(
  { sample }: TableLayout,
  time: TimeLayout,
  order: TableDateOrder,
): number | null {
  const counts = new Map<number, number>();
  let previous: number | null = null;
  for (const row of sample) {
    const label = readLabel(row, time, order);
    if (label === null) continue;
    const minutes = previous === null ? 0 : (label.ms - previous) / 60_000;
    if (minutes > 0) counts.set(minutes, (counts.get(minutes) ?? 0) + 1);
    previous = label.ms;
  }
  const [commonest] = [...counts].sort((a, b) => b[1] - a[1]);
  return commonest?.[0] ?? null;
}
