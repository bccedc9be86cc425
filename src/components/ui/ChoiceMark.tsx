/** Which of the two names of an A-or-B setting is chosen. */
export type Chosen = 'first' | 'second';

interface ChoiceMarkProps {
  readonly chosen: Chosen;
  /** Height in px; 18 beside a value on a tag. */
  readonly size?: number | undefined;
  readonly label?: string | undefined;
}

/** Two boxes side by side, the chosen one filled. They have no low and no high, so they do not stand upright. */
export function ChoiceMark({ chosen, size = 18, label }: ChoiceMarkProps) {
  return (
    <>
      <svg
        className="level-mark"
        width={(size * 21) / 18}
        height={size}
        viewBox="0 0 21 18"
        focusable="false"
        aria-hidden="true"
      >
        <rect
          x={0.75}
          y={4.25}
          width={8.5}
          height={9.5}
          rx={1.5}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.5}
        />
        <rect
          x={11.75}
          y={4.25}
          width={8.5}
          height={9.5}
          rx={1.5}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.5}
        />
        <rect x={chosen === 'first' ? 2.75 : 13.75} y={6.25} width={4.5} height={5.5} fill="currentColor" />
      </svg>
      {label && <span className="sr-only">{label}</span>}
    </>
  );
}
