import { expect, it } from 'vitest';
import { listErrors, problemsByField } from './save-problems.js';

it('puts what the server refused at the field it names', () => {
  expect(
    problemsByField({
      type: 'about:blank',
      title: 'Refused',
      status: 422,
      errors: [
        { path: 'document.catch.dish.apertureDiameterM', reason: 'too small.', fix: 'Take 0.5 m or more.' },
      ],
    }),
  ).toEqual([{ path: 'document.catch.dish.apertureDiameterM', message: 'too small. Take 0.5 m or more.' }]);
});

it('keeps a refusal that names no field', () => {
  expect(
    problemsByField({ type: 'about:blank', title: 'Not allowed', status: 403, detail: 'Read only.' }),
  ).toEqual([{ path: '', message: 'Read only.' }]);
});

it('lists nested errors with the names of their fields', () => {
  const errors = {
    name: { type: 'too_small', message: 'a name is needed' },
    document: {
      catch: { dish: { apertureDiameterM: { type: 'too_small', message: 'at least 0.5 m' } } },
      use: { loads: [{ hourlyWeights: [undefined, { type: 'invalid_type', message: 'a number' }] }] },
    },
  };
  expect(listErrors(errors)).toEqual([
    { path: 'name', label: 'Name', message: 'a name is needed' },
    { path: 'document.catch.dish.apertureDiameterM', label: 'Aperture diameter', message: 'at least 0.5 m' },
    { path: 'document.use.loads.0.hourlyWeights.1', label: 'Hot water by hour', message: 'a number' },
  ]);
});
