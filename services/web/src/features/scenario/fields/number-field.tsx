import { Field, Input, makeStyles, tokens } from '@fluentui/react-components';
import type { ScenarioField } from '@noonwell/schema';
import { formPath } from '../model/form-values.js';
import { fieldLabel } from './field-label.js';
import { formatRange } from './format-range.js';
import { useText } from './use-text.js';

const useStyles = makeStyles({
  // Grows with its column; the browser's own least width of an input would widen the page at 390 px.
  input: { minWidth: 0, width: '100%', '& input': { textAlign: 'end', minWidth: 0 } },
  unit: { color: tokens.colorNeutralForeground3, whiteSpace: 'nowrap' },
});

/** A number with its unit behind it and its range below it; the error takes the range's place. */
export function NumberField({ field, readOnly }: { field: ScenarioField; readOnly: boolean }) {
  const styles = useStyles();
  const { ref, text, setText, onBlur, message } = useText(formPath(field.path));
  return (
    <Field
      label={fieldLabel(field)}
      {...(message !== null ? { validationMessage: message } : { hint: formatRange(field) })}
    >
      <Input
        className={styles.input}
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          setText(value);
        }}
        onBlur={onBlur}
        readOnly={readOnly}
        inputMode={field.kind === 'integer' ? 'numeric' : 'decimal'}
        autoComplete="off"
        contentAfter={field.unit === '1' ? null : <span className={styles.unit}>{field.unit}</span>}
      />
    </Field>
  );
}
