import type { ReactNode } from 'react';
import { FieldError } from './FieldError.tsx';

/** What ties a control to its label, help and error. Spread it on the control. */
export interface FieldWiring {
  readonly id: string;
  readonly 'aria-describedby'?: string;
  readonly 'aria-invalid'?: true;
}

export interface FieldWords {
  /** Unique on the page; the label, help and error get ids made from it. */
  readonly id: string;
  readonly label: ReactNode;
  /** For a control in a table row, whose column already says it to the eye. */
  readonly labelHidden?: boolean | undefined;
  /** Follows the label in plain weight, such as "(may be left out)". */
  readonly mark?: string | undefined;
  readonly help?: ReactNode;
  readonly error?: ReactNode;
}

interface FieldProps extends FieldWords {
  /** Ids of further words that describe the control, such as its unit. */
  readonly describedBy?: string | undefined;
  readonly children: (wiring: FieldWiring) => ReactNode;
}

function joinIds(ids: readonly (string | false | undefined)[]): string | undefined {
  const present = ids.filter(Boolean);
  return present.length > 0 ? present.join(' ') : undefined;
}

/** Label above, help under it, the control, and the error below, read out together by a screen reader. */
export function Field({ id, label, labelHidden, mark, help, error, describedBy, children }: FieldProps) {
  const describing = joinIds([Boolean(help) && `${id}-help`, describedBy, Boolean(error) && `${id}-error`]);
  const wiring: FieldWiring = {
    id,
    ...(describing ? { 'aria-describedby': describing } : {}),
    ...(error ? { 'aria-invalid': true as const } : {}),
  };

  return (
    <div className="field">
      <label htmlFor={id} className={labelHidden ? 'sr-only' : 'field-label'}>
        {label}
        {mark && <span className="field-mark"> {mark}</span>}
      </label>
      {help && (
        <p id={`${id}-help`} className="field-help">
          {help}
        </p>
      )}
      {children(wiring)}
      <FieldError id={id}>{error}</FieldError>
    </div>
  );
}
