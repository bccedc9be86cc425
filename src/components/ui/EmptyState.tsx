import type { ReactNode } from 'react';
import { BlankTag } from './BlankTag.tsx';

interface EmptyStateProps {
  readonly title: ReactNode;
  /** What to do first. */
  readonly children?: ReactNode;
  readonly actions?: ReactNode;
}

/** Stands where a list will be. Says what will hang here and what to do first. */
export function EmptyState({ title, children, actions }: EmptyStateProps) {
  return (
    <div className="empty-state">
      <BlankTag />
      <h2>{title}</h2>
      {children && <div className="empty-state-words">{children}</div>}
      {actions && <div className="button-row">{actions}</div>}
    </div>
  );
}
