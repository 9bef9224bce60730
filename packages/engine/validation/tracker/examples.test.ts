import { expect, it } from 'vitest';
import * as azimuth from '../../src/tracker/azimuth.js';
import { degrees, radians } from '../angles.js';
import { documentedExamples, evaluateExample } from '../documented-examples.js';

it.each(documentedExamples(new URL('../../src/tracker/', import.meta.url)))(
  '$file: $expression is $promised',
  (example) => {
    const error = Math.abs(evaluateExample(example, { ...azimuth, degrees, radians }) - example.promised);
    expect(error).toBeLessThanOrEqual(example.halfUnit * (1 + 1e-9));
  },
);
