import { RECEIVER_KINDS, newScenario } from '@noonwell/schema';
import { expect, it } from 'vitest';
import { formSchema, formValues } from './form-values.js';

const WEATHER = '00000000-0000-4000-8000-0000000000aa';

it.each(RECEIVER_KINDS)('saves an untouched form as what it was (%s)', (kind) => {
  const scenario = { name: 'Mine', weatherYearId: WEATHER, document: newScenario(kind) };
  expect(formSchema.parse(formValues(scenario))).toEqual(scenario);
});

it('takes an empty weather year for none', () => {
  const values = formValues({ name: 'Mine', weatherYearId: null, document: newScenario('coil') });
  expect(formSchema.parse(values).weatherYearId).toBeNull();
});

it('names fields that only make sense together at the field to change', () => {
  const document = newScenario('coil');
  document.catch.receiver.faceSideM = 4.9;
  const parsed = formSchema.safeParse(formValues({ name: 'Mine', weatherYearId: null, document }));
  expect(parsed.error?.issues.map(({ path }) => path.join('.'))).toEqual([
    'document.catch.receiver.faceSideM',
  ]);
});
