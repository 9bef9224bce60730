import { COMMON_PRACTICE, INVENTED, numberField } from '../../field.js';

/** Fields of every kind of pipe. */
export const PIPE_SIZES = {
  lengthM: numberField({
    label: 'Length each way',
    unit: 'm',
    min: 0.1,
    max: 500,
    defaultValue: 8,
    help: 'Pipe between tank and receiver, one way.',
    source: INVENTED,
  }),
  boreMm: numberField({
    label: 'Bore',
    unit: 'mm',
    min: 4,
    max: 200,
    defaultValue: 20,
    help: 'Inner diameter of the pipe.',
    source: INVENTED,
  }),
  wallMm: numberField({
    label: 'Wall',
    unit: 'mm',
    min: 0.2,
    max: 20,
    defaultValue: 1,
    help: 'Thickness of the copper wall. Its heat capacity is paid each morning.',
    source: INVENTED,
  }),
  insulationMm: numberField({
    label: 'Insulation',
    unit: 'mm',
    min: 0,
    max: 300,
    defaultValue: 30,
    help: 'Thickness of the insulation around the pipe.',
    source: INVENTED,
  }),
  insulationConductivityWmK: numberField({
    label: 'Insulation conductivity',
    unit: 'W/(m·K)',
    min: 0.01,
    max: 1,
    defaultValue: 0.04,
    help: 'Of the insulation at its working temperature.',
    source: COMMON_PRACTICE,
  }),
};
