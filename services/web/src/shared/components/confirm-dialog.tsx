import {
  Button,
  Dialog,
  DialogActions,
  DialogBody,
  DialogContent,
  DialogSurface,
  DialogTitle,
  Spinner,
} from '@fluentui/react-components';
import type { ReactNode } from 'react';
import { ErrorState } from './error-state.js';

interface ConfirmDialogProps {
  open: boolean;
  title: string;
  /** What is lost, in a sentence. */
  children: ReactNode;
  /** The deed as a verb: "Delete study". */
  confirmLabel: string;
  busy: boolean;
  /** Of the last try, with what could not be done. */
  error?: { what: string; error: unknown } | null;
  onConfirm: () => void;
  onCancel: () => void;
}

/** Asks before something is lost. The safe answer has the focus. */
export function ConfirmDialog({
  open,
  title,
  children,
  confirmLabel,
  busy,
  error,
  onConfirm,
  onCancel,
}: ConfirmDialogProps) {
  return (
    <Dialog
      open={open}
      modalType="alert"
      onOpenChange={(_, data) => {
        if (!data.open && !busy) onCancel();
      }}
    >
      <DialogSurface>
        <DialogBody>
          <DialogTitle>{title}</DialogTitle>
          <DialogContent>
            {children}
            {error != null && <ErrorState what={error.what} error={error.error} />}
          </DialogContent>
          <DialogActions>
            <Button onClick={onCancel} disabled={busy} autoFocus>
              Keep it
            </Button>
            <Button
              appearance="primary"
              onClick={onConfirm}
              disabled={busy}
              {...(busy ? { icon: <Spinner size="tiny" /> } : {})}
            >
              {confirmLabel}
            </Button>
          </DialogActions>
        </DialogBody>
      </DialogSurface>
    </Dialog>
  );
}
