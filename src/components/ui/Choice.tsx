import type { ComponentProps, ReactNode } from 'react';
import { ChoiceSign } from './ChoiceSign.tsx';
import { FieldError } from './FieldError.tsx';
import { type Hazard, HazardSign } from './HazardSign.tsx';

export interface ChoiceOption {
  readonly value: string;
  readonly label: string;
  readonly help?: string | undefined;
  /** Draws its warning triangle before the words. */
  readonly hazard?: Hazard | undefined;
  readonly disabled?: boolean | undefined;
}

interface ChoiceProps
  extends Omit<ComponentProps<'input'>, 'id' | 'type' | 'value' | 'defaultValue' | 'className' | 'children'> {
  readonly id: string;
  readonly name: string;
  /** The question that the options answer. */
  readonly legend: ReactNode;
  readonly legendHidden?: boolean | undefined;
  readonly mark?: string | undefined;
  readonly help?: ReactNode;
  readonly error?: ReactNode;
  readonly options: readonly ChoiceOption[];
  /** Chips stand in a row; cards have room for a line of help each. */
  readonly shape?: 'chips' | 'cards' | undefined;
  /** Any number of the options instead of one of them. */
  readonly several?: boolean | undefined;
  readonly value?: string | readonly string[] | undefined;
  readonly defaultValue?: string | readonly string[] | undefined;
}

function holds(chosen: string | readonly string[], value: string): boolean {
  return typeof chosen === 'string' ? chosen === value : chosen.includes(value);
}

function checkedProps(props: Pick<ChoiceProps, 'value' | 'defaultValue'>, option: string) {
  if (props.value !== undefined) return { checked: holds(props.value, option) };
  if (props.defaultValue !== undefined) return { defaultChecked: holds(props.defaultValue, option) };
  return {};
}

/**
 * One or several of a few options, all in view. Native radio buttons or checkboxes carry name, state and keyboard;
 * further props (`onChange`, `onBlur`, `ref`) go to each of them, so a form library can register the group.
 */
export function Choice(props: ChoiceProps) {
  const { id, name, legend, legendHidden, mark, help, error, options, shape = 'chips', ...rest } = props;
  const { several = false, value, defaultValue, ...input } = rest;
  const describedBy = [help && `${id}-help`, error && `${id}-error`].filter(Boolean).join(' ');
  const kind = several ? 'checkbox' : 'radio';

  return (
    <fieldset
      id={id}
      className={error ? 'field choice-invalid' : 'field'}
      aria-describedby={describedBy || undefined}
    >
      <legend className={legendHidden ? 'sr-only' : 'field-label'}>
        {legend}
        {mark && <span className="field-mark"> {mark}</span>}
      </legend>
      {help && (
        <p id={`${id}-help`} className="field-help">
          {help}
        </p>
      )}
      <div className={shape === 'cards' ? 'choice-cards' : 'choice-options'}>
        {options.map((option) => (
          <label key={option.value} className={shape === 'cards' ? 'choice choice-card' : 'choice'}>
            <input
              {...input}
              type={kind}
              className="choice-input"
              name={name}
              value={option.value}
              disabled={option.disabled || input.disabled}
              {...checkedProps({ value, defaultValue }, option.value)}
            />
            <span className="choice-face">
              <ChoiceSign kind={kind} />
              {option.hazard && <HazardSign hazard={option.hazard} />}
              <span className="choice-words">
                <span className="choice-label" data-label={option.label}>
                  {option.label}
                </span>
                {option.help && <span className="choice-help">{option.help}</span>}
              </span>
            </span>
          </label>
        ))}
      </div>
      <FieldError id={id}>{error}</FieldError>
    </fieldset>
  );
}
