interface ChoiceSignProps {
  readonly kind: 'radio' | 'checkbox';
}

/** A ring with a dot, or a box with a tick; CSS shows the inner part while the option is chosen. */
export function ChoiceSign({ kind }: ChoiceSignProps) {
  return (
    <svg
      className="choice-sign"
      width={24}
      height={24}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      focusable="false"
    >
      {kind === 'radio' ? (
        <circle cx={12} cy={12} r={9} />
      ) : (
        <rect x={3} y={3} width={18} height={18} rx={3} />
      )}
      {kind === 'radio' ? (
        <circle className="choice-sign-on" cx={12} cy={12} r={4} fill="currentColor" />
      ) : (
        <path className="choice-sign-on" d="m7.5 12.5 3.2 3.2L16.8 9" />
      )}
    </svg>
  );
}
