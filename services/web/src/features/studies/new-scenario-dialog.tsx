import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  Field,
  Input,
  makeStyles,
  Radio,
  RadioGroup,
  Spinner,
} from '@fluentui/react-components';
import { zodResolver } from '@hookform/resolvers/zod';
import { createScenarioRequestSchema, fieldRegistry, RECEIVER_KINDS, receiverSchema } from '@noonwell/schema';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';
import { ErrorState } from '../../shared/components/error-state.js';
import type { NewScenarioValues } from './scenario-mutations.js';

const formSchema = z.strictObject({
  name: createScenarioRequestSchema.shape.name,
  receiver: z.enum(RECEIVER_KINDS),
});

const useStyles = makeStyles({ fields: { display: 'grid', gap: '14px' } });

interface NewScenarioDialogProps {
  busy: boolean;
  error: Error | null;
  onSubmit: (values: NewScenarioValues) => void;
  onClose: () => void;
}

/** Name and receiver; everything else starts from the default machine and is changed in the editor. */
export function NewScenarioDialog({ busy, error, onSubmit, onClose }: NewScenarioDialogProps) {
  const styles = useStyles();
  const form = useForm<NewScenarioValues>({
    resolver: zodResolver(formSchema),
    defaultValues: { name: '', receiver: RECEIVER_KINDS[0] },
  });
  const meta = fieldRegistry.get(receiverSchema);
  return (
    <Dialog
      open
      onOpenChange={(_, data) => {
        if (!data.open && !busy) onClose();
      }}
    >
      <DialogSurface>
        <form
          noValidate
          onSubmit={(event) => {
            void form.handleSubmit(onSubmit)(event);
          }}
        >
          <DialogBody>
            <DialogTitle>Add a scenario</DialogTitle>
            <DialogContent className={styles.fields}>
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
              {error !== null && <ErrorState what="The scenario was not added." error={error} />}
            </DialogContent>
            <DialogActions>
              <Button onClick={onClose} disabled={busy}>
                Cancel
              </Button>
              <Button
                type="submit"
                appearance="primary"
                disabledFocusable={busy}
                icon={busy ? <Spinner size="tiny" /> : null}
              >
                Add and open
              </Button>
            </DialogActions>
          </DialogBody>
        </form>
      </DialogSurface>
    </Dialog>
  );
}
