import { z } from 'zod';
import { runSummarySchema } from './summary.js';

/** One documented key of a run's summary. */
export interface SummaryFigure {
  /** Keys joined by dots: "monthly.powerAcKwh". */
  readonly path: string;
  /** Empty where the value is a text. */
  readonly unit: string;
  readonly description: string;
}

/** Every key of the summary with unit and meaning, in the order in which it is written. */
export function summaryFigures(): readonly SummaryFigure[] {
  return collect(runSummarySchema, '');
}

function collect(schema: z.core.$ZodType, path: string): SummaryFigure[] {
  const meta = z.globalRegistry.get(schema);
  if (meta?.description !== undefined) {
    return [
      { path, unit: typeof meta['unit'] === 'string' ? meta['unit'] : '', description: meta.description },
    ];
  }
  if (schema instanceof z.core.$ZodNullable) {
    return collect(schema._zod.def.innerType, path).map((figure) => ({
      ...figure,
      description: `${figure.description}; null where it does not apply`,
    }));
  }
  if (!(schema instanceof z.ZodObject)) return [];
  return Object.entries<z.core.$ZodType>(schema.shape).flatMap(([key, child]) =>
    collect(child, path === '' ? key : `${path}.${key}`),
  );
}
