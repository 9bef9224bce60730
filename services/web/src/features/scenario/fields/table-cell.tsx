import { Field, Input, makeStyles, mergeClasses } from '@fluentui/react-components';
import type { ClipboardEvent } from 'react';
import { useText } from './use-text.js';

const useStyles = makeStyles({
  input: { minWidth: 0, width: '100%', '& input': { minWidth: 0 } },
  number: { '& input': { textAlign: 'end' } },
});

interface TableCellProps {
  name: string;
  /** Column and row: the cell has no label of its own to be seen. */
  label: string;
  numeric: boolean;
  readOnly: boolean;
  onPaste: (event: ClipboardEvent<HTMLElement>) => void;
}

export function TableCell({ name, label, numeric, readOnly, onPaste }: TableCellProps) {
  const styles = useStyles();
  const { ref, text, setText, onBlur, message, untouched } = useText(name);
  return (
    <Field size="small" {...(message === null || untouched ? {} : { validationMessage: message })}>
      <Input
        className={mergeClasses(styles.input, numeric && styles.number)}
        size="small"
        aria-label={label}
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          setText(value);
        }}
        onBlur={onBlur}
        onPaste={onPaste}
        readOnly={readOnly}
        inputMode={numeric ? 'decimal' : 'text'}
        autoComplete="off"
      />
    </Field>
  );
}
