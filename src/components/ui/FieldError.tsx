import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';

interface FieldErrorProps {
  /** Of the control; the words get `<id>-error`, which the control names in aria-describedby. */
  readonly id: string;
  readonly children?: ReactNode;
}

/** What is wrong with one answer and what to type instead. Nothing at all while there is nothing wrong. */
export function FieldError({ id, children }: FieldErrorProps) {
  if (!children) return null;
  return (
    <p id={`${id}-error`} className="field-error">
      <Icon name="caution" />
      <span>{children}</span>
    </p>
  );
}
