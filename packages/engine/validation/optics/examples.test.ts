import { expect, it } from 'vitest';
import * as bessel from '../../src/optics/bessel.js';
import * as claim from '../../src/optics/claim.js';
import * as dishRelations from '../../src/optics/dish.js';
import * as intercept from '../../src/optics/intercept.js';
import * as limits from '../../src/optics/limits.js';
import { degrees, radians } from '../angles.js';
import { documentedExamples, evaluateExample } from '../documented-examples.js';
import { dish } from './example-dish.js';

const scope = { ...bessel, ...claim, ...dishRelations, ...intercept, ...limits, degrees, radians, dish };

it.each(documentedExamples(new URL('../../src/optics/', import.meta.url)))(
  '$file: $expression is $promised',
  (example) => {
    const error = Math.abs(evaluateExample(example, scope) - example.promised);
    expect(error).toBeLessThanOrEqual(example.halfUnit * (1 + 1e-9));
  },
);
