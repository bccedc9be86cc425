/** Where a number setting stands in its window. "Now" is no level: it is a pin on the setting track. */
export type Level = 'low' | 'middle' | 'high';

interface LevelMarkProps {
  readonly level: Level;
  /** Height in px; 18 beside a value on a tag. */
  readonly size?: number | undefined;
  /** Said by a screen reader where no word or value beside the mark says it. */
  readonly label?: string | undefined;
}

const fillTop: Readonly<Record<Level, number | null>> = { low: null, middle: 9, high: 3 };

/** An upright gauge: empty at low, half full in the middle, full at high. In the color of the words around it. */
export function LevelMark({ level, size = 18, label }: LevelMarkProps) {
  const top = fillTop[level];
  return (
    <>
      <svg
        className="level-mark"
        width={(size * 13) / 18}
        height={size}
        viewBox="0 0 13 18"
        focusable="false"
        aria-hidden="true"
      >
        <rect
          x={0.75}
          y={0.75}
          width={11.5}
          height={16.5}
          rx={2}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.5}
        />
        {top !== null && <rect x={3} y={top} width={7} height={15 - top} rx={0.5} fill="currentColor" />}
      </svg>
      {label && <span className="sr-only">{label}</span>}
    </>
  );
}
