import type { ReactNode } from 'react';

interface Props {
  readonly number: number;
  readonly id: string;
  readonly title: string;
  readonly children: ReactNode;
}

/** One of the five answers, in the order in which a supervisor asks. */
export function Numbered({ number, id, title, children }: Props) {
  return (
    <section className="sheet verdict-part" aria-labelledby={id}>
      <p className="verdict-number" aria-hidden="true">
        {number}
      </p>
      <div className="verdict-answer">
        <h2 id={id}>{title}</h2>
        {children}
      </div>
    </section>
  );
}
