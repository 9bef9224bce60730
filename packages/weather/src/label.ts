import { TABLE_LABELS, type TableLabel } from '@noonwell/schema';

/** Share of a record's interval that lies before the moment its label names. */
export const LABEL_SHARE: Readonly<Record<TableLabel, number>> = { start: 0, middle: 0.5, end: 1 };

/** Minutes from the label to the middle of the record, where the sun of its means stands. */
export function labelToMiddleMinutes(label: TableLabel, intervalMinutes: number): number {
  return (0.5 - LABEL_SHARE[label]) * intervalMinutes;
}

/** "the hour that ends at the label", "the 30 min that start at the label" */
export function intervalOfLabel(label: TableLabel, intervalMinutes: number): string {
  const isHour = intervalMinutes === 60;
  const what = isHour ? 'the hour' : `the ${intervalMinutes} min`;
  const verb = { start: 'start', middle: 'lie', end: 'end' }[label] + (isHour ? 's' : '');
  return `${what} that ${verb} ${label === 'middle' ? 'about' : 'at'} the label`;
}

/** The label whose interval has its middle nearest to an offset from the label; null where none is near. */
export function labelNearest(
  minutes: number,
  intervalMinutes: number,
  toleranceMinutes: number,
): TableLabel | null {
  return (
    TABLE_LABELS.find(
      (label) => Math.abs(labelToMiddleMinutes(label, intervalMinutes) - minutes) < toleranceMinutes,
    ) ?? null
  );
}
