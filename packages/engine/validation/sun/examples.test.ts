import { expect, it } from 'vitest';
import * as airMass from '../../src/sun/air-mass.js';
import * as clearSky from '../../src/sun/clear-sky.js';
import * as erbs from '../../src/sun/erbs.js';
import * as extraterrestrial from '../../src/sun/extraterrestrial.js';
import * as incidence from '../../src/sun/incidence.js';
import * as refraction from '../../src/sun/refraction.js';
import { degrees, radians } from '../angles.js';
import { documentedExamples, evaluateExample } from '../documented-examples.js';

const scope = {
  ...airMass,
  ...clearSky,
  ...erbs,
  ...extraterrestrial,
  ...incidence,
  ...refraction,
  degrees,
  radians,
};

it.each(documentedExamples(new URL('../../src/sun/', import.meta.url)))(
  '$file: $expression is $promised',
  (example) => {
    const error = Math.abs(evaluateExample(example, scope) - example.promised);
    expect(error).toBeLessThanOrEqual(example.halfUnit * (1 + 1e-9));
  },
);
