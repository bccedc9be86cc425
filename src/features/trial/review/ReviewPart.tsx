import { type ReactNode, useId } from 'react';

interface Props {
  readonly title: string;
  readonly children: ReactNode;
}

/** Lines that belong together, on one sheet. */
export function ReviewPart({ title, children }: Props) {
  const id = useId();
  return (
    <section className="sheet grid grid-cols-[minmax(0,1fr)] gap-3" aria-labelledby={id}>
      <h2 id={id}>{title}</h2>
      <dl className="review-lines">{children}</dl>
    </section>
  );
}
