import { WEATHER_CHANNELS } from '@noonwell/engine';
import { FEBRUARY_29_END_SLOT, FEBRUARY_29_FIRST_SLOT, LEAP_YEAR_HOURS, slotOf } from '../calendar.js';
import { LABEL_SHARE } from '../label.js';
import { LONGEST_FILLED_GAP_HOURS } from '../gaps.js';
import type { ProblemList } from '../problem.js';
import type { ReadPlan } from './plan.js';
import type { TableRows } from './rows.js';
import { labelText } from './time.js';

const HOUR_MS = 3_600_000;
const LISTED_LINES = 10;

/** The records of a year in calendar order, each with its row. */
export interface CalendarOrder {
  /** Row of each record; −1 where the table has none. */
  readonly rows: Int32Array;
  /** Start in local standard time. */
  readonly startLocalMs: Float64Array;
}

/**
 * Puts rows into the order of the calendar by the day and time that their labels name, whatever year each
 * month comes from. Doubles with the same values are dropped and noted, others refused; absent rows of up to
 * 3 h become missing records, longer gaps are refused.
 */
export function orderByCalendar(
  rows: TableRows,
  plan: ReadPlan,
  notes: string[],
  problems: ProblemList,
): CalendarOrder | null {
  const intervalMs = plan.intervalMinutes * 60_000;
  const perHour = 60 / plan.intervalMinutes;
  const slots = LEAP_YEAR_HOURS * perHour;
  const rowOfSlot = new Int32Array(slots).fill(-1);
  // Labels at the end belong to the day that ends with them: 24:00, or 0:00 of the next.
  const ofLabel = (labelMs: number) => (plan.label === 'end' ? labelMs - intervalMs : labelMs);
  const phaseMs = (((rows.labelMs[0] ?? 0) % intervalMs) + intervalMs) % intervalMs;
  const doubles: number[] = [];
  let previousSlot = -1;
  let firstSlot = -1;
  const steps: { line: number; text: string; slot: number }[] = [];

  for (let row = 0; row < rows.count; row += 1) {
    const labelMs = rows.labelMs[row]!;
    const line = rows.lines[row]!;
    if (((labelMs % intervalMs) + intervalMs) % intervalMs !== phaseMs) {
      problems.add({
        line,
        value: labelText(labelMs),
        reason: `The label does not lie ${plan.intervalMinutes} min from its neighbours like the others.`,
        fix: 'Give records of one interval throughout.',
      });
      continue;
    }
    const at = new Date(ofLabel(labelMs));
    const hour = slotOf(at.getUTCMonth() + 1, at.getUTCDate(), at.getUTCHours() + 1);
    const slot = hour * perHour + Math.floor(at.getUTCMinutes() / plan.intervalMinutes);
    const seen = rowOfSlot[slot]!;
    if (seen >= 0) {
      if (sameRecord(rows, seen, row)) doubles.push(line);
      else refuseDouble(rows, seen, row, problems);
      continue;
    }
    rowOfSlot[slot] = row;
    if (firstSlot < 0) firstSlot = slot;
    else if (slot < previousSlot) steps.push({ line, text: labelText(labelMs), slot });
    previousSlot = slot;
  }
  noteOrder(steps, previousSlot < firstSlot, notes, problems);
  if (doubles.length > 0) {
    notes.push(
      `${doubles.length} ${doubles.length === 1 ? 'line stands' : 'lines stand'} twice with the same values and ${doubles.length === 1 ? 'was' : 'were'} read once: ${listLines(doubles)}.`,
    );
  }
  if (rows.count === 0) {
    problems.add({ line: plan.firstDataLine, reason: 'No rows follow.', fix: 'Give a whole year.' });
    return null;
  }

  const leapFrom = FEBRUARY_29_FIRST_SLOT * perHour;
  const leapTo = FEBRUARY_29_END_SLOT * perHour;
  const hasLeapDay = rowOfSlot.subarray(leapFrom, leapTo).some((row) => row >= 0);
  const inYear = Int32Array.from({ length: slots }, (_, slot) => slot).filter(
    (slot) => hasLeapDay || slot < leapFrom || slot >= leapTo,
  );
  const ordered = inYear.map((slot) => rowOfSlot[slot]!);
  noteAbsent(ordered, inYear, rows, plan, notes, problems);
  if (problems.count > 0) return null;
  return toLocal(ordered, rows, plan, intervalMs);
}

function sameRecord(rows: TableRows, first: number, second: number): boolean {
  return (
    rows.labelMs[first] === rows.labelMs[second] &&
    WEATHER_CHANNELS.every((channel) => Object.is(rows.values[channel][first], rows.values[channel][second]))
  );
}

function refuseDouble(rows: TableRows, first: number, second: number, problems: ProblemList): void {
  const label = rows.labelMs[second]!;
  const sameTime = rows.labelMs[first] === label;
  problems.add({
    line: rows.lines[second]!,
    value: labelText(label),
    reason: sameTime
      ? `This time stands already in line ${rows.lines[first]!}, with other values.`
      : `This day and time of the year stands already in line ${rows.lines[first]!}, for ${labelText(rows.labelMs[first]!)}.`,
    fix: sameTime
      ? 'Keep one line for each record; export in standard time if the clock is set back in autumn.'
      : 'Give one year, or a typical year with each month once.',
  });
}

/** One step back to January is a year that begins in another month; more are rows out of order. */
function noteOrder(
  steps: readonly { line: number; text: string; slot: number }[],
  endsBeforeItBegins: boolean,
  notes: string[],
  problems: ProblemList,
): void {
  const [turn] = steps;
  if (turn === undefined) return;
  if (steps.length === 1 && endsBeforeItBegins) {
    notes.push(
      `The table turns from one year to the next in line ${turn.line}; its records were put in calendar order, from January to December.`,
    );
    return;
  }
  for (const { line, text } of steps) {
    problems.add({
      line,
      value: text,
      reason: 'This record is earlier than the one before it.',
      fix: 'Put the lines in the order of time.',
    });
  }
}

function noteAbsent(
  ordered: Int32Array,
  slots: Int32Array,
  rows: TableRows,
  plan: ReadPlan,
  notes: string[],
  problems: ProblemList,
): void {
  const longest = (LONGEST_FILLED_GAP_HOURS * 60) / plan.intervalMinutes;
  const after: number[] = [];
  let absent = 0;
  for (let at = 0; at < ordered.length; at += 1) {
    if (ordered[at]! >= 0) continue;
    const from = at;
    while (at < ordered.length && ordered[at]! < 0) at += 1;
    const count = at - from;
    const before = ordered[from - 1];
    const lineBefore = before === undefined ? plan.firstDataLine - 1 : rows.lines[before]!;
    if (count <= longest) {
      absent += count;
      after.push(lineBefore);
      continue;
    }
    const [first, last] = [slots[from]!, slots[at - 1]!].map((slot) => slotLabel(slot, plan));
    problems.add({
      line: lineBefore + 1,
      reason: `${count} records are missing, from ${first} to ${last} (${rows.count} rows, ${ordered.length} needed).`,
      fix: `Gaps of at most ${LONGEST_FILLED_GAP_HOURS} hours are filled: give the rows of longer ones, and a whole year.`,
    });
  }
  if (absent > 0) {
    notes.push(
      `${absent} ${absent === 1 ? 'record is' : 'records are'} missing and ${absent === 1 ? 'was' : 'were'} filled, after ${listLines(after)}.`,
    );
  }
}

/** "06-16 17:00": month, day and time by the label's clock. */
function slotLabel(slot: number, plan: ReadPlan): string {
  const startMs = Date.UTC(2000, 0, 1) + slot * plan.intervalMinutes * 60_000;
  return labelText(startMs).slice(5);
}

function listLines(lines: readonly number[]): string {
  const listed = lines.slice(0, LISTED_LINES).join(', ');
  const more = lines.length - LISTED_LINES;
  return `${lines.length === 1 ? 'line' : 'lines'} ${listed}${more > 0 ? ` and ${more} more` : ''}`;
}

/**
 * Start of each record in local standard time. Records that the step from the label's clock takes into the
 * neighbouring year go to the other end: with UTC labels the first hours of January are the last of December.
 */
function toLocal(ordered: Int32Array, rows: TableRows, plan: ReadPlan, intervalMs: number): CalendarOrder {
  const shiftMs =
    (plan.clock === 'utc' ? plan.utcOffsetHours * HOUR_MS : 0) - LABEL_SHARE[plan.label] * intervalMs;
  const labels = Float64Array.from(ordered, (row) => (row < 0 ? NaN : rows.labelMs[row]!));
  for (let at = 1; at < labels.length; at += 1) {
    if (Number.isNaN(labels[at])) labels[at] = labels[at - 1]! + intervalMs;
  }
  for (let at = labels.length - 2; at >= 0; at -= 1) {
    if (Number.isNaN(labels[at])) labels[at] = labels[at + 1]! - intervalMs;
  }
  const starts = labels.map((label) => label + shiftMs);
  const half = starts.length / 2;
  const month = (at: number) => new Date(starts[at]!).getUTCMonth();
  const every = Array.from(starts.keys());
  const toEnd = every.filter((at) => at < half && month(at) === 11);
  const toFront = every.filter((at) => at >= half && month(at) === 0);
  const stay = every.filter((at) => (at < half ? month(at) !== 11 : month(at) !== 0));
  const order = [...toFront, ...stay, ...toEnd];
  return {
    rows: Int32Array.from(order, (at) => ordered[at]!),
    startLocalMs: Float64Array.from(order, (at) => starts[at]!),
  };
}
