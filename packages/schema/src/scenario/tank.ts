import { z } from 'zod';
import { INVENTED, fieldRegistry, integerField, numberField } from '../field.js';

const plantRoomSchema = z.strictObject({
  kind: z.literal('plantRoom'),
  temperatureC: numberField({
    label: 'Plant room',
    unit: '°C',
    min: -20,
    max: 50,
    defaultValue: 20,
    help: 'Temperature around the tank, all year.',
    source: INVENTED,
  }),
});
const outdoorsSchema = z.strictObject({ kind: z.literal('outdoors') });

const matchingLayerSchema = z.strictObject({ kind: z.literal('matchingLayer') });
const fixedHeightSchema = z.strictObject({
  kind: z.literal('fixedHeight'),
  heightFraction: numberField({
    label: 'Height of the inlet',
    unit: '1',
    min: 0,
    max: 1,
    defaultValue: 1,
    help: '0 is the bottom, 1 the top of the tank.',
    source: INVENTED,
  }),
});

export const tankSchema = z.strictObject({
  volumeM3: numberField({
    label: 'Volume',
    unit: 'm³',
    min: 0.05,
    max: 200,
    defaultValue: 2,
    help: 'Water in the tank.',
    source: INVENTED,
  }),
  heightM: numberField({
    label: 'Height of the water',
    unit: 'm',
    min: 0.2,
    max: 20,
    defaultValue: 2,
    help: 'Taller tanks keep their layers better.',
    source: INVENTED,
  }),
  layers: integerField({
    label: 'Layers',
    unit: '1',
    min: 1,
    max: 40,
    defaultValue: 10,
    help: 'The tank is modelled as so many mixed layers of equal mass: 1 is a fully mixed tank.',
    source: INVENTED,
  }),
  lossUaWK: numberField({
    label: 'Shell loss',
    unit: 'W/K',
    min: 0,
    max: 500,
    defaultValue: 3,
    help: 'Conductance of the whole insulated shell to its surroundings.',
    source: INVENTED,
  }),
  surroundings: z.discriminatedUnion('kind', [plantRoomSchema, outdoorsSchema]).register(fieldRegistry, {
    label: 'Where the tank stands',
    unit: '',
    help: "A plant room of steady temperature, or outdoors at the weather's temperature.",
    source: '',
    defaultValue: 'plantRoom',
    choices: { plantRoom: 'Plant room', outdoors: 'Outdoors' },
  }),
  effectiveConductivityWmK: numberField({
    label: 'Conduction between layers',
    unit: 'W/(m·K)',
    min: 0,
    max: 20,
    defaultValue: 1.2,
    help: 'Water conducts about 0.6; wall and slow mixing add to it.',
    source: INVENTED,
  }),
  chargeInlet: z
    .discriminatedUnion('kind', [matchingLayerSchema, fixedHeightSchema])
    .register(fieldRegistry, {
      label: 'Where the hot water enters',
      unit: '',
      help: 'At the layer of its own temperature (a stratifying lance), or at a fixed height.',
      source: '',
      defaultValue: 'matchingLayer',
      choices: { matchingLayer: 'At the matching layer', fixedHeight: 'At a fixed height' },
    }),
  initialTemperatureC: numberField({
    label: 'Temperature at the start',
    unit: '°C',
    min: 1,
    max: 95,
    defaultValue: 40,
    help: 'Of all layers when the year begins. What is left at the end stands in the ledger.',
    source: INVENTED,
  }),
  topLimitC: numberField({
    label: 'Store full at',
    unit: '°C',
    min: 30,
    max: 150,
    defaultValue: 95,
    help: 'When the top layer reaches this the dish turns off the sun.',
    source: INVENTED,
  }),
  topHysteresisK: numberField({
    label: 'Back on sun below the limit by',
    unit: 'K',
    min: 0,
    max: 50,
    defaultValue: 5,
    help: 'The dish returns when the top layer has fallen by this.',
    source: INVENTED,
  }),
});
