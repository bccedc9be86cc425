import type { ComponentProps } from 'react';
import { ChoiceSign } from './ChoiceSign.tsx';
import type { FieldWords } from './Field.tsx';
import { FieldError } from './FieldError.tsx';

interface CheckboxProps
  extends Omit<FieldWords, 'labelHidden' | 'mark'>,
    Omit<ComponentProps<'input'>, keyof FieldWords | 'type' | 'className'> {}

/** One statement to tick. The whole line can be pressed. */
export function Checkbox({ id, label, help, error, ...input }: CheckboxProps) {
  const describedBy = [help && `${id}-help`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <div className="field">
      <label className="choice choice-line">
        <input
          {...input}
          id={id}
          type="checkbox"
          className="choice-input"
          aria-describedby={describedBy || undefined}
          aria-invalid={error ? true : undefined}
        />
        <span className="choice-face">
          <ChoiceSign kind="checkbox" />
          <span className="choice-label">{label}</span>
        </span>
      </label>
      {help && (
        <p id={`${id}-help`} className="field-help checkbox-help">
          {help}
        </p>
      )}
      <FieldError id={id}>{error}</FieldError>
    </div>
  );
}
