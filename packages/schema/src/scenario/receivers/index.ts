import { z } from 'zod';
import { fieldRegistry } from '../../field.js';
import { cellReceiver, cellReceiverSchema } from './cell.js';
import { coilReceiver, coilReceiverSchema } from './coil.js';
import type { ReceiverDefinition } from './definition.js';

/** A new receiver is a new file and its lines here (and its model in the engine's registry). */
export const receiverSchema = z
  .discriminatedUnion('kind', [coilReceiverSchema, cellReceiverSchema])
  .register(fieldRegistry, {
    label: 'Receiver',
    unit: '',
    help: 'What stands at the focus.',
    source: '',
    defaultValue: 'coil',
    choices: { coil: 'Coil receiver: heat only', cell: 'Cell receiver: heat and power' },
  });
export type ReceiverDocument = z.infer<typeof receiverSchema>;
export type ReceiverKind = ReceiverDocument['kind'];
export const RECEIVER_KINDS = ['coil', 'cell'] as const satisfies readonly ReceiverKind[];

type DocumentOf<Kind extends ReceiverKind> = Extract<ReceiverDocument, { kind: Kind }>;

const DEFINITIONS: { readonly [Kind in ReceiverKind]: ReceiverDefinition<DocumentOf<Kind>> } = {
  coil: coilReceiver,
  cell: cellReceiver,
};

/** What a kind of receiver brings besides its fields. */
export function receiverDefinition<Kind extends ReceiverKind>(
  kind: Kind,
): ReceiverDefinition<DocumentOf<Kind>> {
  return DEFINITIONS[kind];
}
