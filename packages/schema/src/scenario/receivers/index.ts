import { z } from 'zod';
import { fieldRegistry } from '../../field.js';
import { cellReceiverSchema } from './cell.js';
import { coilReceiverSchema } from './coil.js';

/** A new receiver is a new file and one line here (and its model in the engine's registry). */
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
