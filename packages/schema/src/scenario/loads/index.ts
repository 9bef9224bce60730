import { z } from 'zod';
import { fieldRegistry } from '../../field.js';
import { commercialHotWater, commercialHotWaterSchema } from './commercial-hot-water.js';
import type { LoadDefinition } from './definition.js';

/** A new load is a new file and its lines here (and its model in the engine's registry). */
export const loadSchema = z.discriminatedUnion('kind', [commercialHotWaterSchema]).register(fieldRegistry, {
  label: 'Load',
  unit: '',
  help: 'Who uses the heat.',
  source: '',
  defaultValue: 'commercialHotWater',
  choices: { commercialHotWater: 'Commercial hot water' },
});
export type LoadDocument = z.infer<typeof loadSchema>;
export type LoadDocumentKind = LoadDocument['kind'];
type DocumentOf<Kind extends LoadDocumentKind> = Extract<LoadDocument, { kind: Kind }>;

const DEFINITIONS: { readonly [Kind in LoadDocumentKind]: LoadDefinition<DocumentOf<Kind>> } = {
  commercialHotWater,
};

/** What a kind of load brings besides its fields. */
export function loadDefinition<Kind extends LoadDocumentKind>(kind: Kind): LoadDefinition<DocumentOf<Kind>> {
  return DEFINITIONS[kind];
}
