import { runSummarySchema, type RunSummary } from '@noonwell/schema';

/** Which way is welcome: more of it, less of it, or neither by itself. */
export type Welcome = 'more' | 'less' | 'neither';

type Shape = typeof runSummarySchema.shape;
/** Keys of the summary that hold one number (or none). */
export type FigureKey = {
  [Key in keyof RunSummary]: RunSummary[Key] extends number | null ? Key : never;
}[keyof RunSummary];

export interface Figure {
  readonly key: FigureKey;
  readonly label: string;
  readonly unit: string;
  readonly welcome: Welcome;
}

/** The yearly totals of the page in its order. What each one means and its unit stand in the summary's schema. */
const SHOWN: readonly (readonly [FigureKey, Welcome])[] = [
  ['beamOnApertureKwh', 'neither'],
  ['heatDeliveredKwh', 'more'],
  ['backupHeatKwh', 'less'],
  ['unmetHeatKwh', 'less'],
  ['boilerFuelKwh', 'less'],
  ['solarFraction', 'more'],
  ['powerAcKwh', 'more'],
  ['ownUseKwh', 'more'],
  ['gridImportKwh', 'less'],
  ['gridExportKwh', 'more'],
  ['pumpUseKwh', 'less'],
  ['trackerUseKwh', 'less'],
  ['heatToFluidOfBeam', 'more'],
  ['powerAcOfBeam', 'more'],
  ['faceMaxC', 'neither'],
  ['cellMaxC', 'neither'],
  ['tankTopMaxC', 'neither'],
  ['pumpHours', 'neither'],
];

export const FIGURES: readonly Figure[] = SHOWN.map(([key, welcome]) => ({
  key,
  welcome,
  ...describe(runSummarySchema.shape[key]),
}));

function describe(schema: Shape[FigureKey]): { label: string; unit: string } {
  // A figure that may be missing carries its description on the number inside.
  const meta = schema.meta() ?? ('unwrap' in schema ? schema.unwrap().meta() : undefined);
  // "Solar fraction: 1 − …": the name stands before the colon, what it means behind it.
  const [label = ''] = (meta?.description ?? '').split(':');
  return { label, unit: typeof meta?.unit === 'string' ? meta.unit : '' };
}
