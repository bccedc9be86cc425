import { type ReactNode, useEffect, useId, useRef } from 'react';
import { Button } from './Button.tsx';

interface DialogProps {
  readonly open: boolean;
  /** Called for Escape and for the close button; the caller then sets `open` to false. */
  readonly onClose: () => void;
  readonly title: ReactNode;
  readonly closeLabel: string;
  readonly children?: ReactNode;
  /** Buttons, the main one last. */
  readonly actions?: ReactNode;
  /** "alertdialog" for a question that must be answered before anything else. */
  readonly role?: 'dialog' | 'alertdialog' | undefined;
}

/**
 * The browser's own modal dialog: it keeps the keyboard inside, hides the page behind from screen readers and gives the
 * focus back to where it came from. An element inside with `data-first-focus` gets the focus first; React's own autoFocus
 * would come too early, while the dialog is still closed.
 */
export function Dialog({ open, onClose, title, closeLabel, children, actions, role }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) {
      element.showModal();
      element.querySelector<HTMLElement>('[data-first-focus]')?.focus();
    }
    if (!open && element.open) element.close();
  }, [open]);

  return (
    <dialog
      ref={dialog}
      className="dialog"
      role={role}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
    >
      {open && (
        <>
          <div className="dialog-head">
            <h2 id={titleId}>{title}</h2>
            <Button kind="quiet" icon="cross" onClick={onClose}>
              {closeLabel}
            </Button>
          </div>
          {children && <div className="dialog-body">{children}</div>}
          {actions && <div className="dialog-foot">{actions}</div>}
        </>
      )}
    </dialog>
  );
}
