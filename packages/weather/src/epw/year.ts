import { FEBRUARY_29_END_SLOT, FEBRUARY_29_FIRST_SLOT, LEAP_YEAR_HOURS, slotText } from '../calendar.js';
import type { ProblemList } from '../problem.js';
import type { EpwRows } from './rows.js';

/** Slots of the file's calendar in order: 8784 when any hour of 29 February is there, else 8760. */
export function slotsOfYear(rows: EpwRows): Int32Array {
  const isLeapDay = (slot: number) => slot >= FEBRUARY_29_FIRST_SLOT && slot < FEBRUARY_29_END_SLOT;
  const hasLeapDay = rows.lines.some((line, slot) => line !== 0 && isLeapDay(slot));
  return Int32Array.from({ length: LEAP_YEAR_HOURS }, (_, slot) => slot).filter(
    (slot) => hasLeapDay || !isLeapDay(slot),
  );
}

/** Adds one problem for each run of hours that no line gives. */
export function findMissingHours(
  rows: EpwRows,
  slots: Int32Array,
  header: { dataLine: number },
  problems: ProblemList,
): void {
  const have = slots.reduce((count, slot) => count + (rows.lines[slot] === 0 ? 0 : 1), 0);
  if (have === 0) {
    problems.add({
      line: header.dataLine,
      reason:
        rows.rowCount === 0 ? 'No hours follow the DATA PERIODS line.' : 'No line names an hour of the year.',
      fix: `Give a whole year of ${slots.length} hours.`,
    });
    return;
  }
  for (let at = 0; at < slots.length; at += 1) {
    if (rows.lines[slots[at]!] !== 0) continue;
    const from = at;
    while (at < slots.length && rows.lines[slots[at]!] === 0) at += 1;
    const first = slotText(slots[from]!);
    const last = slotText(slots[at - 1]!);
    const count = at - from;
    const lineBefore = from > 0 ? rows.lines[slots[from - 1]!]! : header.dataLine - 1;
    const what =
      count === 1
        ? `The hour ${first} is missing`
        : at === slots.length
          ? `The file stops before ${first}: ${count} hours to ${last} are missing`
          : `${count} hours from ${first} to ${last} are missing`;
    problems.add({
      line: lineBefore + 1,
      reason: `${what} (${rows.rowCount} lines of hours, ${slots.length} needed).`,
      fix: 'Give every hour of the year once; if the file was cut short, download or export it again.',
    });
  }
}
