import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './Field.tsx';

interface SliderProps
  extends FieldWords,
    Omit<ComponentProps<'input'>, keyof FieldWords | 'className' | 'type'> {
  /** The value in words beside the track and for a screen reader, such as "12 runs" or "no limit". */
  readonly valueWords: string;
}

/** How much one can spare. The browser's own range control: arrow keys, Home and End work; its words say the value. */
export function Slider(props: SliderProps) {
  const { id, label, labelHidden, mark, help, error, valueWords, ...input } = props;
  return (
    <Field {...{ id, label, labelHidden, mark, help, error }}>
      {(wiring) => (
        <div className="slider">
          <input {...input} {...wiring} type="range" className="slider-input" aria-valuetext={valueWords} />
          <output htmlFor={id} className="slider-value">
            {valueWords}
          </output>
        </div>
      )}
    </Field>
  );
}
