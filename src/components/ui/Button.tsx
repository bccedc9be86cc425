import type { ComponentProps, MouseEvent, ReactNode } from 'react';
import { type ButtonLook, buttonClass } from './button-class.ts';
import { Icon, type IconName } from './Icon.tsx';
import { Spinner } from './Spinner.tsx';

interface ButtonProps extends ButtonLook, Omit<ComponentProps<'button'>, 'className' | 'children'> {
  readonly children: ReactNode;
  readonly icon?: IconName | undefined;
  /** While true the button says `busyLabel`, keeps its width and the focus, and ignores further presses. */
  readonly busy?: boolean | undefined;
  readonly busyLabel?: string | undefined;
}

/** One action. `type` is "button" unless the caller says "submit", so a button in a form never sends it by accident. */
export function Button(props: ButtonProps) {
  const {
    children,
    kind,
    size,
    wide,
    icon,
    busy = false,
    busyLabel,
    onClick,
    type = 'button',
    ...rest
  } = props;

  function press(event: MouseEvent<HTMLButtonElement>) {
    if (busy) {
      event.preventDefault();
      return;
    }
    onClick?.(event);
  }

  return (
    <button
      {...rest}
      type={type}
      className={buttonClass({ kind, size, wide })}
      onClick={press}
      {...(busy ? { 'aria-busy': true, 'aria-disabled': true } : {})}
    >
      {busy ? <Spinner /> : icon && <Icon name={icon} />}
      {busyLabel === undefined ? (
        children
      ) : (
        <span className="button-words">
          <span className={busy ? 'invisible' : undefined} aria-hidden={busy}>
            {children}
          </span>
          <span className={busy ? undefined : 'invisible'} aria-hidden={!busy}>
            {busyLabel}
          </span>
        </span>
      )}
    </button>
  );
}
