import { Field, Input, InfoLabel, makeStyles, tokens } from '@fluentui/react-components';
import type { ScenarioField } from '@noonwell/schema';
import { useId, type ClipboardEvent } from 'react';
import { useFormContext, useFormState, get } from 'react-hook-form';
import { MONTH_NAMES } from '../../../shared/format/date.js';
import { pastedNumbers } from '../model/draft.js';
import { formPath } from '../model/form-values.js';
import { formatRange } from './format-range.js';
import { useText } from './use-text.js';

const useStyles = makeStyles({
  root: { border: 'none', margin: 0, padding: 0, minWidth: 0, gridColumn: '1 / -1' },
  legend: { padding: 0, marginBottom: '2px' },
  hint: { margin: '0 0 6px', color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
  grid: {
    display: 'grid',
    gridTemplateColumns: 'repeat(12, minmax(0, 1fr))',
    gap: '6px',
    '@media (max-width: 900px)': { gridTemplateColumns: 'repeat(6, minmax(0, 1fr))' },
    '@media (max-width: 479px)': { gridTemplateColumns: 'repeat(4, minmax(0, 1fr))' },
  },
  input: { minWidth: 0, width: '100%', '& input': { textAlign: 'end', minWidth: 0 } },
  error: { margin: '4px 0 0', color: tokens.colorPaletteRedForeground1, fontSize: tokens.fontSizeBase200 },
});

/** A number for each hour or month; a row or column of cells can be pasted into any of them. */
export function ListField({ field, readOnly }: { field: ScenarioField; readOnly: boolean }) {
  const styles = useStyles();
  const errorId = useId();
  const { setValue } = useFormContext();
  const { errors } = useFormState({ name: formPath(field.path) });
  const length = field.length ?? 0;
  // Of the list as a whole ("at least one hour needs a weight"); those of single numbers stand at their cells.
  const whole: unknown = get(errors, formPath(field.path));
  const message = messageOf(whole);

  const paste = (first: number, event: ClipboardEvent<HTMLElement>) => {
    const numbers = pastedNumbers(event.clipboardData.getData('text/plain'));
    if (numbers.length < 2) return;
    event.preventDefault();
    numbers.slice(0, length - first).forEach((text, offset) => {
      setValue(formPath(`${field.path}.${first + offset}`), text, {
        shouldDirty: true,
        shouldValidate: true,
      });
    });
  };

  return (
    <fieldset className={styles.root} {...(message === null ? {} : { 'aria-describedby': errorId })}>
      <legend className={styles.legend}>
        <InfoLabel info={`${field.help} Source: ${field.source}`}>{field.label}</InfoLabel>
      </legend>
      <p className={styles.hint}>
        {length} numbers, {formatRange(field)}
        {readOnly ? '' : '; paste a row of cells into any of them'}
      </p>
      <div className={styles.grid}>
        {Array.from({ length }, (_, index) => (
          <Cell
            key={index}
            name={formPath(`${field.path}.${index}`)}
            label={cellLabel(index, length)}
            readOnly={readOnly}
            onPaste={(event) => {
              paste(index, event);
            }}
          />
        ))}
      </div>
      {message !== null && (
        <p id={errorId} className={styles.error} role="alert">
          {message}
        </p>
      )}
    </fieldset>
  );
}

interface CellProps {
  name: string;
  label: string;
  readOnly: boolean;
  onPaste: (event: ClipboardEvent<HTMLElement>) => void;
}

function Cell({ name, label, readOnly, onPaste }: CellProps) {
  const styles = useStyles();
  const { ref, text, setText, onBlur, message } = useText(name);
  return (
    <Field label={label} size="small" {...(message === null ? {} : { validationMessage: message })}>
      <Input
        className={styles.input}
        size="small"
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          setText(value);
        }}
        onBlur={onBlur}
        onPaste={onPaste}
        readOnly={readOnly}
        inputMode="decimal"
        autoComplete="off"
      />
    </Field>
  );
}

function messageOf(error: unknown): string | null {
  if (typeof error !== 'object' || error === null || Array.isArray(error)) return null;
  return 'message' in error && typeof error.message === 'string' ? error.message : null;
}

function cellLabel(index: number, length: number): string {
  return length === MONTH_NAMES.length ? (MONTH_NAMES[index] ?? '') : `${index}–${index + 1}`;
}
