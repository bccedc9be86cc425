import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { type CalloutTone, toneIcons } from './Callout.tsx';
import { Icon } from './Icon.tsx';

interface ToastProps {
  readonly tone: CalloutTone;
  readonly children: ReactNode;
  readonly closeLabel: string;
  readonly onClose: () => void;
}

/** A short word on what was just done, such as "Saved". Whatever must be read or acted on is a `Callout` instead. */
export function Toast({ tone, children, closeLabel, onClose }: ToastProps) {
  return (
    <li className={`toast callout-${tone}`}>
      <Icon name={toneIcons[tone]} />
      <div className="toast-words">{children}</div>
      <Button kind="quiet" icon="cross" onClick={onClose}>
        {closeLabel}
      </Button>
    </li>
  );
}

interface ToastListProps {
  /** Names the region for a screen reader. */
  readonly label: string;
  readonly children?: ReactNode;
}

/** The corner where toasts stand. It must be on the page before the first toast is, or that one is not read out. */
export function ToastList({ label, children }: ToastListProps) {
  return (
    <ul className="toasts" aria-live="polite" aria-label={label}>
      {children}
    </ul>
  );
}
