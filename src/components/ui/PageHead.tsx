import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';

interface PageHeadProps {
  readonly title: ReactNode;
  /** One line under the title: what this page is for, or where things stand. */
  readonly note?: ReactNode;
  readonly back?: { readonly href: string; readonly label: string } | undefined;
  readonly actions?: ReactNode;
}

/** The one `h1` of a page with what can be done on it. */
export function PageHead({ title, note, back, actions }: PageHeadProps) {
  return (
    <div className="page-head">
      <div className="page-head-words">
        {back && (
          <a className="page-head-back" href={back.href}>
            <Icon name="chevron-left" size={20} />
            {back.label}
          </a>
        )}
        <h1>{title}</h1>
        {note && <p className="page-head-note">{note}</p>}
      </div>
      {actions && <div className="button-row">{actions}</div>}
    </div>
  );
}
