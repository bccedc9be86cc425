import type { ComponentProps, ReactNode } from 'react';
import { Field, type FieldWords } from './Field.tsx';

interface NumberInputProps
  extends FieldWords,
    Omit<ComponentProps<'input'>, keyof FieldWords | 'className' | 'type' | 'inputMode'> {
  /** Stands behind the figure and is read out with it. */
  readonly unit?: ReactNode;
}

/**
 * A figure as typed. A text field with the number keypad, never `type="number"`: that refuses the decimal comma and
 * lets a wheel change a value unseen. What was typed is parsed by the form's schema.
 */
export function NumberInput(props: NumberInputProps) {
  const { id, label, labelHidden, mark, help, error, unit, ...input } = props;
  const unitId = unit ? `${id}-unit` : undefined;
  return (
    <Field {...{ id, label, labelHidden, mark, help, error }} describedBy={unitId}>
      {(wiring) => (
        <div className="input-frame input-frame-number">
          <input
            autoComplete="off"
            {...input}
            {...wiring}
            type="text"
            inputMode="decimal"
            className="input input-number"
          />
          {unit && (
            <span id={unitId} className="input-unit">
              {unit}
            </span>
          )}
        </div>
      )}
    </Field>
  );
}
