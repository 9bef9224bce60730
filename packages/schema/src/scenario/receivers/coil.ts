import { z } from 'zod';
import { INVENTED, numberField } from '../../field.js';
import type { ReceiverDefinition } from './definition.js';
import { faceFields, faceProblems, toFace } from './face.js';

export const coilReceiverSchema = z.strictObject({
  kind: z.literal('coil'),
  ...faceFields,
  coilUaWK: numberField({
    label: 'Face to water',
    unit: 'W/K',
    min: 0.5,
    max: 5000,
    defaultValue: 18,
    help: 'Conductance from the face to the water in the coil. A poor joint lets the face glow: it decides the face temperature and so the losses.',
    source: INVENTED,
  }),
});

export const coilReceiver: ReceiverDefinition<z.infer<typeof coilReceiverSchema>> = {
  toSettings: (document) => ({ kind: 'coil', face: toFace(document), coilUaWK: document.coilUaWK }),
  problems: faceProblems,
  pumpDefaults: {},
};
