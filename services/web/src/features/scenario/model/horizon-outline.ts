import { horizonPointSchema, type HorizonPointDocument } from '@noonwell/schema';
import { z } from 'zod';
import { parseNumber } from './draft.js';

const typedPairs = z.array(
  z
    .record(z.string(), z.unknown())
    .transform((row) =>
      Object.fromEntries(
        Object.entries(row).map(([key, text]) => [key, typeof text === 'string' ? parseNumber(text) : text]),
      ),
    )
    .pipe(horizonPointSchema),
);

/**
 * The line to draw from 0° to 360° through the typed pairs: it crosses north at the height of the line between
 * the last pair and the first. Null while there is no pair, or one that the schema refuses.
 */
export function horizonOutline(typed: unknown): HorizonPointDocument[] | null {
  const pairs = typedPairs.safeParse(typed);
  if (!pairs.success) return null;
  const sorted = pairs.data.toSorted((one, other) => one.azimuthDeg - other.azimuthDeg);
  const first = sorted[0];
  const last = sorted.at(-1);
  if (first === undefined || last === undefined) return null;
  const gapDeg = first.azimuthDeg + 360 - last.azimuthDeg;
  const share = gapDeg > 0 ? (360 - last.azimuthDeg) / gapDeg : 0;
  const northDeg = last.elevationDeg + (first.elevationDeg - last.elevationDeg) * share;
  return [{ azimuthDeg: 0, elevationDeg: northDeg }, ...sorted, { azimuthDeg: 360, elevationDeg: northDeg }];
}
