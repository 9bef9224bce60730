import { Field, Select } from '@fluentui/react-components';
import type { ScenarioField } from '@noonwell/schema';
import { useRef } from 'react';
import { useFormContext } from 'react-hook-form';
import { DECIDING_PATHS, variantDraft, type DraftValue } from '../model/draft.js';
import { formPath } from '../model/form-values.js';
import { fieldLabel } from './field-label.js';
import { useText } from './use-text.js';

/** One of a few. Where other fields depend on it, it brings their defaults along, or what was typed before. */
export function ChoiceField({ field, readOnly }: { field: ScenarioField; readOnly: boolean }) {
  const { ref, text, setText, onBlur, message } = useText(formPath(field.path));
  const { getValues, setValue } = useFormContext();
  const left = useRef(new Map<string, DraftValue>());
  const branch = field.path.slice(0, field.path.lastIndexOf('.'));

  const choose = (value: string) => {
    if (!DECIDING_PATHS.includes(field.path)) {
      setText(value);
      return;
    }
    // Somebody who looks at the other variant and comes back finds what they had typed.
    left.current.set(text, getValues(formPath(branch)) as DraftValue);
    const next = left.current.get(value) ?? variantDraft(branch, value);
    setValue(formPath(branch), next, { shouldDirty: true, shouldValidate: true });
  };

  return (
    <Field label={fieldLabel(field)} {...(message !== null ? { validationMessage: message } : {})}>
      <Select
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          choose(value);
        }}
        onBlur={onBlur}
        disabled={readOnly}
      >
        {Object.entries(field.choices ?? {}).map(([value, label]) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </Select>
    </Field>
  );
}
