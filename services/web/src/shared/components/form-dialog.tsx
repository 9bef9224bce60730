import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  makeStyles,
  Spinner,
} from '@fluentui/react-components';
import type { ReactNode, SubmitEventHandler } from 'react';
import { ErrorState } from './error-state.js';

const useStyles = makeStyles({ fields: { display: 'grid', gap: '14px' } });

interface FormDialogProps {
  title: string;
  submitLabel: string;
  /** "The study was not created." */
  failure: string;
  busy: boolean;
  error: Error | null;
  onSubmit: SubmitEventHandler<HTMLFormElement>;
  onClose: () => void;
  /** The fields. */
  children: ReactNode;
}

/** A form in a dialog: it stays open with what was typed until the answer is there, and cannot be left meanwhile. */
export function FormDialog({
  title,
  submitLabel,
  failure,
  busy,
  error,
  onSubmit,
  onClose,
  children,
}: FormDialogProps) {
  const styles = useStyles();
  return (
    <Dialog
      open
      onOpenChange={(_, data) => {
        if (!data.open && !busy) onClose();
      }}
    >
      <DialogSurface>
        <form noValidate onSubmit={onSubmit}>
          <DialogBody>
            <DialogTitle>{title}</DialogTitle>
            <DialogContent className={styles.fields}>
              {children}
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
