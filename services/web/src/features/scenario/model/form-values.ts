import { saveScenarioRequestSchema, type ScenarioView } from '@noonwell/schema';
import { z } from 'zod';
import { fromDraft, toDraft } from './draft.js';

/** What the form holds: all of it text. An empty weather year is none. */
export interface FormValues {
  name: string;
  weatherYearId: string;
  /** A Draft; typed loosely, because the form's path types do not end in a type that holds itself. */
  document: Record<string, unknown>;
}

const wanted = saveScenarioRequestSchema.omit({ basedOnVersion: true });
export type SavedValues = z.output<typeof wanted>;

/** From typed text to what is saved, by the schema that the server checks again. */
export const formSchema = z
  .custom<FormValues>()
  .transform(({ name, weatherYearId, document }): z.input<typeof wanted> => ({
    name,
    weatherYearId: weatherYearId === '' ? null : weatherYearId,
    // Unknown until the schema behind has looked at it.
    document: fromDraft(document),
  }))
  .pipe(wanted);

export function formValues(scenario: Pick<ScenarioView, 'name' | 'weatherYearId' | 'document'>): FormValues {
  return {
    name: scenario.name,
    weatherYearId: scenario.weatherYearId ?? '',
    document: toDraft(scenario.document),
  };
}

/** Where a field of the document stands in the form. */
export function formPath(path: string): string {
  return `document.${path}`;
}
