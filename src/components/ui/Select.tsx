import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './Field.tsx';
import { Icon } from './Icon.tsx';

export interface SelectOption {
  readonly value: string;
  readonly label: string;
}

interface SelectProps
  extends FieldWords,
    Omit<ComponentProps<'select'>, keyof FieldWords | 'className' | 'children'> {
  readonly options: readonly SelectOption[];
  /** The words of the empty first entry, such as "Pick one"; without them the first option is chosen. */
  readonly emptyLabel?: string | undefined;
}

/** One of many by the phone's own list. Up to five options are quicker as a `Choice`. */
export function Select(props: SelectProps) {
  const { id, label, labelHidden, mark, help, error, options, emptyLabel, ...select } = props;
  return (
    <Field {...{ id, label, labelHidden, mark, help, error }}>
      {(wiring) => (
        <div className="select-frame">
          <select {...select} {...wiring} className="input">
            {emptyLabel !== undefined && <option value="">{emptyLabel}</option>}
            {options.map((option) => (
              <option key={option.value} value={option.value}>
                {option.label}
              </option>
            ))}
          </select>
          <Icon name="chevron-down" />
        </div>
      )}
    </Field>
  );
}
