import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './Field.tsx';

interface TextInputProps extends FieldWords, Omit<ComponentProps<'input'>, keyof FieldWords | 'className'> {}

/** One line of words with its label. Further props, `ref` among them, go to the input, so a form library can register it. */
export function TextInput(props: TextInputProps) {
  const { id, label, labelHidden, mark, help, error, ...input } = props;
  return (
    <Field {...{ id, label, labelHidden, mark, help, error }}>
      {(wiring) => <input type="text" {...input} {...wiring} className="input" />}
    </Field>
  );
}
