import { type ReactNode, useId } from 'react';

interface Props {
  readonly title?: ReactNode;
  readonly help?: ReactNode;
  readonly children: ReactNode;
}

/** Questions that belong together, on one sheet of the page. */
export function QuestionPart({ title, help, children }: Props) {
  const id = useId();
  return (
    <section className="sheet grid grid-cols-[minmax(0,1fr)] gap-6" aria-labelledby={title ? id : undefined}>
      {title && (
        <div>
          <h2 id={id}>{title}</h2>
          {help && <p className="text-steel">{help}</p>}
        </div>
      )}
      {children}
    </section>
  );
}
