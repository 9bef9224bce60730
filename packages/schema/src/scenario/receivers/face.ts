import type { FaceSettings } from '@noonwell/engine';
import { INVENTED, numberField } from '../../field.js';
import { fitsBeforeDish, type CrossFieldProblem } from '../problem.js';

/** Fields that every receiver with a flat square face has. */
export const faceFields = {
  faceSideM: numberField({
    label: 'Side of the square face',
    unit: 'm',
    min: 0.02,
    max: 5,
    defaultValue: 0.28,
    help: 'Side of the flat square that takes up the light. Smaller loses less heat and spills more light.',
    source: INVENTED,
  }),
  absorptance: numberField({
    label: 'Solar absorptance',
    unit: '1',
    min: 0.1,
    max: 1,
    defaultValue: 0.92,
    help: 'Share of the light on the face that is not reflected.',
    source: INVENTED,
  }),
  emittance: numberField({
    label: 'Thermal emittance',
    unit: '1',
    min: 0.01,
    max: 1,
    defaultValue: 0.9,
    help: "Share of a black body's radiation that the hot face gives off.",
    source: INVENTED,
  }),
  backLossWK: numberField({
    label: 'Back loss',
    unit: 'W/K',
    min: 0,
    max: 100,
    defaultValue: 0.3,
    help: 'Conductance through the insulation behind the face to the air.',
    source: INVENTED,
  }),
  heatCapacityJK: numberField({
    label: 'Heat capacity',
    unit: 'J/K',
    min: 100,
    max: 1e6,
    defaultValue: 6000,
    help: 'Heat capacity of face, metal and the water inside: what each morning must warm up.',
    source: INVENTED,
  }),
  windHeightFactor: numberField({
    label: 'Wind at the receiver over wind in the file',
    unit: '1',
    min: 0,
    max: 2,
    defaultValue: 0.84,
    help: "0.84 stands for 3 m over open ground when the file's wind is measured at 10 m.",
    source: 'one-seventh power law, common practice, no source',
  }),
};

interface FaceDocument {
  readonly faceSideM: number;
  readonly absorptance: number;
  readonly emittance: number;
  readonly backLossWK: number;
  readonly heatCapacityJK: number;
  readonly windHeightFactor: number;
}

export function toFace(document: FaceDocument): FaceSettings {
  return {
    sideM: document.faceSideM,
    absorptance: document.absorptance,
    emittance: document.emittance,
    backLossWK: document.backLossWK,
    heatCapacityJK: document.heatCapacityJK,
    windHeightFactor: document.windHeightFactor,
  };
}

export function faceProblems(document: FaceDocument, apertureDiameterM: number): CrossFieldProblem[] {
  if (fitsBeforeDish(document.faceSideM, apertureDiameterM)) return [];
  const message =
    'The receiver is larger than the dish: its diagonal must be less than the aperture diameter';
  return [{ path: 'catch.receiver.faceSideM', message }];
}
