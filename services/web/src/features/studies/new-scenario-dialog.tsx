import { Field, Input, Radio, RadioGroup } from '@fluentui/react-components';
import { zodResolver } from '@hookform/resolvers/zod';
import { createScenarioRequestSchema, fieldRegistry, RECEIVER_KINDS, receiverSchema } from '@noonwell/schema';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';
import { FormDialog } from '../../shared/components/form-dialog.js';
import type { NewScenarioValues } from './scenario-mutations.js';

const formSchema = z.strictObject({
  name: createScenarioRequestSchema.shape.name,
  receiver: z.enum(RECEIVER_KINDS),
});

interface NewScenarioDialogProps {
  busy: boolean;
  error: Error | null;
  onSubmit: (values: NewScenarioValues) => void;
  onClose: () => void;
}

/** Name and receiver; everything else starts from the default machine and is changed in the editor. */
export function NewScenarioDialog({ busy, error, onSubmit, onClose }: NewScenarioDialogProps) {
  const form = useForm<NewScenarioValues>({
    resolver: zodResolver(formSchema),
    defaultValues: { name: '', receiver: RECEIVER_KINDS[0] },
  });
  const meta = fieldRegistry.get(receiverSchema);
  return (
    <FormDialog
      title="Add a scenario"
      submitLabel="Add and open"
      failure="The scenario was not added."
      busy={busy}
      error={error}
      onSubmit={(event) => {
        void form.handleSubmit(onSubmit)(event);
      }}
      onClose={onClose}
    >
      <Field label="Name" required validationMessage={form.formState.errors.name?.message}>
        <Input {...form.register('name')} />
      </Field>
      <Field label={meta?.label ?? 'Receiver'} hint={meta?.help}>
        <Controller
          name="receiver"
          control={form.control}
          render={({ field: { onChange, ...field } }) => (
            <RadioGroup
              {...field}
              onChange={(_, { value }) => {
                onChange(value);
              }}
            >
              {RECEIVER_KINDS.map((kind) => (
                <Radio key={kind} value={kind} label={meta?.choices?.[kind] ?? kind} />
              ))}
            </RadioGroup>
          )}
        />
      </Field>
    </FormDialog>
  );
}
