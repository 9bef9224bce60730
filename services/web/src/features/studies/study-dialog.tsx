import { Field, Input, Textarea } from '@fluentui/react-components';
import { zodResolver } from '@hookform/resolvers/zod';
import { createStudyRequestSchema } from '@noonwell/schema';
import { Controller, useForm } from 'react-hook-form';
import type { z } from 'zod';
import { FormDialog } from '../../shared/components/form-dialog.js';

type Values = z.output<typeof createStudyRequestSchema>;

interface StudyDialogProps {
  title: string;
  submitLabel: string;
  /** "The study was not created." */
  failure: string;
  initial?: Values;
  busy: boolean;
  error: Error | null;
  onSubmit: (values: Values) => void;
  onClose: () => void;
}

/** Name and question of a study, new or changed. */
export function StudyDialog({
  title,
  submitLabel,
  failure,
  initial,
  busy,
  error,
  onSubmit,
  onClose,
}: StudyDialogProps) {
  const form = useForm<z.input<typeof createStudyRequestSchema>, unknown, Values>({
    resolver: zodResolver(createStudyRequestSchema),
    defaultValues: initial ?? { name: '', question: '' },
  });
  const { errors } = form.formState;
  return (
    <FormDialog
      title={title}
      submitLabel={submitLabel}
      failure={failure}
      busy={busy}
      error={error}
      onSubmit={(event) => {
        void form.handleSubmit(onSubmit)(event);
      }}
      onClose={onClose}
    >
      <Field
        label="Name"
        required
        hint="The site or the client, for example"
        validationMessage={errors.name?.message}
      >
        <Input {...form.register('name')} />
      </Field>
      <Field
        label="Question"
        hint="What has to be decided, in a sentence"
        validationMessage={errors.question?.message}
      >
        <Controller
          name="question"
          control={form.control}
          render={({ field: { value, ...field } }) => (
            <Textarea {...field} value={value ?? ''} rows={3} resize="vertical" />
          )}
        />
      </Field>
    </FormDialog>
  );
}
