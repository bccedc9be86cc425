import { Icon } from './Icon.tsx';

export interface Step {
  readonly key: string;
  /** Such as "3". */
  readonly number: string;
  readonly label: string;
  readonly state: 'done' | 'current' | 'gap' | 'open';
  /** Said after the label by a screen reader: "done", "answers missing". Left out for what is simply open. */
  readonly stateWord?: string | undefined;
  /** Left out until the step has been seen once. */
  readonly href?: string | undefined;
}

interface StepperProps {
  readonly label: string;
  readonly steps: readonly Step[];
}

function StepSign({ step }: { readonly step: Step }) {
  if (step.state === 'done') return <Icon name="tick" size={20} className="step-done" />;
  if (step.state === 'gap') return <Icon name="caution" size={20} className="step-gap" />;
  return (
    <span className="step-number" aria-hidden="true">
      {step.number}
    </span>
  );
}

/** Where one is in a row of questions. On a phone the signs share the width and only the current one shows its word. */
export function Stepper({ label, steps }: StepperProps) {
  return (
    <nav className="stepper" aria-label={label}>
      <ol className="stepper-steps">
        {steps.map((step) => {
          const inside = (
            <>
              <StepSign step={step} />
              <span className="step-label">
                <span className="sr-only">{step.number} </span>
                {step.label}
                {step.stateWord && <span className="sr-only"> {step.stateWord}</span>}
              </span>
            </>
          );
          return (
            <li key={step.key} className={step.state === 'current' ? 'step step-current' : 'step'}>
              {step.href === undefined ? (
                <span className="step-inside">{inside}</span>
              ) : (
                <a
                  className="step-inside"
                  href={step.href}
                  aria-current={step.state === 'current' ? 'step' : undefined}
                >
                  {inside}
                </a>
              )}
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
