import { Spinner } from './Spinner.tsx';

interface LoadingProps {
  /** What is being fetched, such as "Getting the runs". */
  readonly label: string;
  /** How many lines of text it holds the room for, so that nothing jumps when they come. */
  readonly lines?: number | undefined;
}

const lineHeight = 24;

/** Stands in the place and size of what will come. */
export function Loading({ label, lines = 3 }: LoadingProps) {
  return (
    <div className="loading" role="status">
      <p className="loading-words">
        <Spinner />
        {label}
      </p>
      {/* One very wide upright line, dashed: each dash is the bar of a line of text. */}
      <svg width="100%" height={lines * lineHeight} aria-hidden="true" focusable="false">
        <line
          x1={0}
          x2={0}
          y1={6}
          y2="100%"
          strokeWidth={4000}
          strokeDasharray="12"
          className="loading-lines"
        />
      </svg>
    </div>
  );
}
