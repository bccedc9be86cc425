import type { ReactNode } from 'react';

interface Props {
  readonly title: ReactNode;
  readonly help?: ReactNode;
}

/** The question of a page; the focus begins here, so that the next key press reaches the first field. */
export function StepHead({ title, help }: Props) {
  return (
    <div className="page-head">
      <div className="page-head-words">
        <h1 tabIndex={-1} className="outline-none">
          {title}
        </h1>
        {help && <p className="page-head-note">{help}</p>}
      </div>
    </div>
  );
}
