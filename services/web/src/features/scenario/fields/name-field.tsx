import { Field, Input } from '@fluentui/react-components';
import { useText } from './use-text.js';

/** The scenario's name, as it stands in every table and chart. */
export function NameField({ readOnly, className }: { readOnly: boolean; className: string }) {
  const { ref, text, setText, onBlur, message } = useText('name');
  return (
    <Field
      label="Name"
      required
      className={className}
      {...(message !== null ? { validationMessage: message } : {})}
    >
      <Input
        ref={ref}
        value={text}
        onChange={(_, { value }) => {
          setText(value);
        }}
        onBlur={onBlur}
        readOnly={readOnly}
        autoComplete="off"
      />
    </Field>
  );
}
