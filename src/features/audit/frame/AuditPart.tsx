import type { ReactNode } from 'react';

interface Props {
  readonly id: string;
  readonly title: string;
  readonly note?: ReactNode;
  readonly children: ReactNode;
}

/** Figures that belong together under one name; the verdict's links lead to its `id`. */
export function AuditPart({ id, title, note, children }: Props) {
  return (
    <div className="audit-part" id={id}>
      <h2>{title}</h2>
      {note && <p className="text-steel">{note}</p>}
      {children}
    </div>
  );
}
