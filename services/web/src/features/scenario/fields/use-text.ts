import { useController } from 'react-hook-form';

/** A field of the form as typed text, with its error. */
export function useText(name: string) {
  const { field, fieldState, formState } = useController<Record<string, unknown>>({ name });
  const { ref, onBlur, onChange, value } = field;
  return {
    ref,
    onBlur,
    text: typeof value === 'string' ? value : '',
    setText: (text: string) => {
      onChange(text);
    },
    message: fieldState.error?.message ?? null,
    /** Nobody has had a chance to fill it in: a row that was just added is not called wrong. */
    untouched: value === '' && !fieldState.isTouched && !formState.isSubmitted,
  };
}
