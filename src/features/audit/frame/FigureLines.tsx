import type { ReactNode } from 'react';

export interface FigureLine {
  readonly key: string;
  readonly label: string;
  readonly value: ReactNode;
  /** A line that the verdict's links lead to. */
  readonly anchor?: string | undefined;
}

interface Props {
  readonly lines: readonly FigureLine[];
}

/** Single figures with their names. */
export function FigureLines({ lines }: Props) {
  return (
    <dl className="figure-lines">
      {lines.map(({ key, label, value, anchor }) => (
        <div key={key} id={anchor} className="figure-line">
          <dt>{label}</dt>
          <dd className="figures">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
