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
  Spinner,
  Textarea,
} from '@fluentui/react-components';
import { zodResolver } from '@hookform/resolvers/zod';
import { createStudyRequestSchema } from '@noonwell/schema';
import { Controller, useForm } from 'react-hook-form';
import type { z } from 'zod';
import { ErrorState } from '../../shared/components/error-state.js';

type Values = z.output<typeof createStudyRequestSchema>;

const useStyles = makeStyles({ fields: { display: 'grid', gap: '14px' } });

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
  const styles = useStyles();
  const form = useForm<z.input<typeof createStudyRequestSchema>, unknown, Values>({
    resolver: zodResolver(createStudyRequestSchema),
    defaultValues: initial ?? { name: '', question: '' },
  });
  const { errors } = form.formState;
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
            <DialogTitle>{title}</DialogTitle>
            <DialogContent className={styles.fields}>
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
              {error !== null && <ErrorState what={failure} error={error} />}
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
                {submitLabel}
              </Button>
            </DialogActions>
          </DialogBody>
        </form>
      </DialogSurface>
    </Dialog>
  );
}
