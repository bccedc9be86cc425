import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { Dialog } from './Dialog.tsx';

interface ConfirmDialogProps {
  readonly open: boolean;
  readonly title: ReactNode;
  /** What will happen, and whether it can be taken back. */
  readonly children?: ReactNode;
  readonly confirmLabel: string;
  readonly busyLabel?: string | undefined;
  readonly cancelLabel: string;
  readonly closeLabel: string;
  readonly kind?: 'primary' | 'stop' | undefined;
  readonly busy?: boolean | undefined;
  readonly onConfirm: () => void;
  readonly onCancel: () => void;
}

/** "Really?" The focus starts on the harmless answer, so that a stray Enter changes nothing. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const { open, title, children, confirmLabel, busyLabel, cancelLabel, closeLabel } = props;
  const { kind = 'primary', busy, onConfirm, onCancel } = props;
  return (
    <Dialog
      role="alertdialog"
      open={open}
      onClose={onCancel}
      title={title}
      closeLabel={closeLabel}
      actions={
        <>
          <Button data-first-focus onClick={onCancel}>
            {cancelLabel}
          </Button>
          <Button kind={kind} busy={busy} busyLabel={busyLabel} onClick={onConfirm}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      {children}
    </Dialog>
  );
}
