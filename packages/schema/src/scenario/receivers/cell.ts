import { z } from 'zod';
import { INVENTED, fieldRegistry, integerField, numberField } from '../../field.js';
import { fitsBeforeDish } from '../problem.js';
import type { ReceiverDefinition } from './definition.js';
import { faceFields, faceProblems, toFace } from './face.js';

const CELL_MODEL = 'form of the relation: model documentation, receivers; value invented';

const noSecondarySchema = z.strictObject({ kind: z.literal('none') });
const mixingDuctSchema = z.strictObject({
  kind: z.literal('mixingDuct'),
  entrySideM: numberField({
    label: "Side of the duct's square entry",
    unit: 'm',
    min: 0.02,
    max: 5,
    defaultValue: 0.28,
    help: 'The duct takes up the light that falls on its entry and leads it to the cells.',
    source: INVENTED,
  }),
  transmittance: numberField({
    label: 'Transmittance of the duct',
    unit: '1',
    min: 0.1,
    max: 1,
    defaultValue: 0.92,
    help: 'Share of the light at its entry that reaches the cells.',
    source: INVENTED,
  }),
  unevenness: numberField({
    label: 'Unevenness behind the duct',
    unit: '1',
    min: 0,
    max: 1,
    defaultValue: 0.1,
    help: 'Half the spread of the local flux over its mean: the cells see from (1 − u) to (1 + u) times the mean, evenly spread.',
    source: INVENTED,
  }),
});

export const cellReceiverSchema = z.strictObject({
  kind: z.literal('cell'),
  ...faceFields,
  secondary: z.discriminatedUnion('kind', [mixingDuctSchema, noSecondarySchema]).register(fieldRegistry, {
    label: 'In front of the cells',
    unit: '',
    help: "A bare array in the focal plane of a good mirror has a peak many times its mean: nearly all of a string's power is lost without a mixing duct or a set-back plane.",
    source: '',
    defaultValue: 'mixingDuct',
    choices: { mixingDuct: 'Mixing duct', none: 'Nothing: bare array in the focal plane' },
  }),
  referenceEfficiency: numberField({
    label: 'Cell efficiency at reference',
    unit: '1',
    min: 0.05,
    max: 0.5,
    defaultValue: 0.39,
    help: 'Efficiency on the light that falls on cells, at the reference concentration and temperature.',
    source: INVENTED,
  }),
  referenceConcentration: numberField({
    label: 'Reference concentration',
    unit: 'suns',
    min: 1,
    max: 2000,
    defaultValue: 500,
    help: 'Local flux over 1000 W/m² at which the reference efficiency is stated.',
    source: INVENTED,
  }),
  referenceTemperatureC: numberField({
    label: 'Reference cell temperature',
    unit: '°C',
    min: 0,
    max: 80,
    defaultValue: 25,
    help: 'Cell temperature at which the reference efficiency is stated.',
    source: INVENTED,
  }),
  seriesConcentration: numberField({
    label: 'Series-resistance concentration',
    unit: 'suns',
    min: 500,
    max: 100_000,
    defaultValue: 6000,
    help: 'Efficiency falls by 1 over this number for each sun above the reference: the loss in series resistance.',
    source: CELL_MODEL,
  }),
  temperatureCoefficientPerK: numberField({
    label: 'Loss of efficiency with temperature',
    unit: '1/K',
    min: 0,
    max: 0.01,
    defaultValue: 0.0012,
    help: 'Relative fall of efficiency for each kelvin above the reference temperature.',
    source: CELL_MODEL,
  }),
  openCircuitVoltageV: numberField({
    label: 'Open-circuit voltage of a cell',
    unit: 'V',
    min: 0.3,
    max: 6,
    defaultValue: 3.1,
    help: 'At reference; sets how efficiency grows with concentration.',
    source: CELL_MODEL,
  }),
  idealityFactor: numberField({
    label: 'Ideality of the junctions together',
    unit: '1',
    min: 1,
    max: 8,
    defaultValue: 3.3,
    help: 'Sum of the ideality factors of the junctions in series.',
    source: CELL_MODEL,
  }),
  operatingVoltageV: numberField({
    label: 'Working voltage of a cell',
    unit: 'V',
    min: 0.2,
    max: 5,
    defaultValue: 2.7,
    help: 'Voltage of a cell at its point of greatest power; weighs a cell against a bypass.',
    source: CELL_MODEL,
  }),
  bypassVoltageV: numberField({
    label: 'Voltage across a bypass',
    unit: 'V',
    min: 0,
    max: 2,
    defaultValue: 0.5,
    help: 'What a bypassed cell costs its string.',
    source: CELL_MODEL,
  }),
  grouping: z.enum(['bypassedString', 'seriesString', 'parallel']).register(fieldRegistry, {
    label: 'Grouping of the cells',
    unit: '',
    help: 'A series string is held to its weakest cell; bypass diodes let it drop weak cells; in parallel no cell holds another.',
    source: '',
    defaultValue: 'bypassedString',
    choices: {
      bypassedString: 'One string with a bypass for each cell',
      seriesString: 'One string without bypass',
      parallel: 'All in parallel',
    },
  }),
  cellsPerSide: integerField({
    label: 'Cells along a side',
    unit: '1',
    min: 1,
    max: 40,
    defaultValue: 14,
    help: 'The array is square: 14 means 196 cells.',
    source: INVENTED,
  }),
  packingFraction: numberField({
    label: 'Packing',
    unit: '1',
    min: 0.1,
    max: 1,
    defaultValue: 0.9,
    help: "Share of the array's area that is active cell. Light on the rest becomes heat.",
    source: INVENTED,
  }),
  plateUaWK: numberField({
    label: 'Plate to coolant',
    unit: 'W/K',
    min: 5,
    max: 20_000,
    defaultValue: 900,
    help: 'Conductance from the cooled plate to the water.',
    source: INVENTED,
  }),
  cellAreaResistanceM2KW: numberField({
    label: 'Cell to plate',
    unit: 'm²K/W',
    min: 0,
    max: 1e-3,
    defaultValue: 4e-5,
    help: 'Thermal resistance of a unit area between cell and plate: the cell is hotter than the plate by the local flux times this.',
    source: INVENTED,
  }),
  cellTemperatureLimitC: numberField({
    label: 'Hottest allowed cell',
    unit: '°C',
    min: 40,
    max: 250,
    defaultValue: 110,
    help: 'When the hottest cell would pass this the dish turns off the sun.',
    source: INVENTED,
  }),
  inverterRatingW: numberField({
    label: 'Inverter rating',
    unit: 'W',
    min: 100,
    max: 500_000,
    defaultValue: 5000,
    help: 'Greatest alternating-current power. Above it the array is held back, and what it does not convert becomes heat.',
    source: INVENTED,
  }),
  inverterEfficiency: numberField({
    label: 'Inverter efficiency at its rating',
    unit: '1',
    min: 0.5,
    max: 1,
    defaultValue: 0.95,
    help: 'Alternating over direct-current power at the rating.',
    source: INVENTED,
  }),
  inverterStandingLossFraction: numberField({
    label: 'Inverter standing loss',
    unit: '1',
    min: 0,
    max: 0.05,
    defaultValue: 0.005,
    help: 'Loss that does not depend on the power, as a share of the rating; it makes part load less efficient.',
    source: INVENTED,
  }),
});

type CellDocument = z.infer<typeof cellReceiverSchema>;

export const cellReceiver: ReceiverDefinition<CellDocument> = {
  toSettings: (document) => ({
    kind: 'cell',
    face: toFace(document),
    secondary: document.secondary,
    cell: {
      referenceEfficiency: document.referenceEfficiency,
      referenceConcentration: document.referenceConcentration,
      referenceTemperatureC: document.referenceTemperatureC,
      seriesConcentration: document.seriesConcentration,
      temperatureCoefficientPerK: document.temperatureCoefficientPerK,
      openCircuitVoltageV: document.openCircuitVoltageV,
      idealityFactor: document.idealityFactor,
      operatingVoltageV: document.operatingVoltageV,
      bypassVoltageV: document.bypassVoltageV,
      areaResistanceM2KW: document.cellAreaResistanceM2KW,
      temperatureLimitC: document.cellTemperatureLimitC,
    },
    grouping: document.grouping,
    cellsPerSide: document.cellsPerSide,
    packingFraction: document.packingFraction,
    plateUaWK: document.plateUaWK,
    inverter: {
      ratingW: document.inverterRatingW,
      efficiency: document.inverterEfficiency,
      standingLossFraction: document.inverterStandingLossFraction,
    },
  }),
  problems: (document, apertureDiameterM) => [
    ...faceProblems(document, apertureDiameterM),
    ...ductProblems(document, apertureDiameterM),
    ...inverterProblems(document),
  ],
  // Cells want cooler water than a coil: it leaves at 84 °C, and the coolant never passes 85 °C.
  pumpDefaults: { setPointC: 84, outletLimitC: 85 },
};

function ductProblems({ secondary }: CellDocument, apertureDiameterM: number) {
  if (secondary.kind !== 'mixingDuct' || fitsBeforeDish(secondary.entrySideM, apertureDiameterM)) return [];
  const message =
    "The duct's entry is larger than the dish: its diagonal must be less than the aperture diameter";
  return [{ path: 'catch.receiver.secondary.entrySideM', message }];
}

function inverterProblems(document: CellDocument) {
  if (document.inverterStandingLossFraction <= 1 / document.inverterEfficiency - 1) return [];
  const message =
    'The standing loss alone is more than the whole loss at the rating: lower it or the efficiency';
  return [{ path: 'catch.receiver.inverterStandingLossFraction', message }];
}
