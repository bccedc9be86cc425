import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './Field.tsx';

interface TextAreaProps
  extends FieldWords,
    Omit<ComponentProps<'textarea'>, keyof FieldWords | 'className'> {}

/** Several lines of words with their label. Further props, `ref` among them, go to the textarea. */
export function TextArea(props: TextAreaProps) {
  const { id, label, labelHidden, mark, help, error, ...textarea } = props;
  return (
    <Field {...{ id, label, labelHidden, mark, help, error }}>
      {(wiring) => <textarea rows={3} {...textarea} {...wiring} className="input" />}
    </Field>
  );
}
