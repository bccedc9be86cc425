import type { ReactNode } from 'react';

interface ActionBarProps {
  /** What leads back or away; at the left. */
  readonly secondary?: ReactNode;
  /** The one action of the page; bottom right on a desk, at the thumb on a phone. */
  readonly children: ReactNode;
}

/** The foot of a form or question. On a phone it stays in view above the keyboard's edge. */
export function ActionBar({ secondary, children }: ActionBarProps) {
  return (
    <div className="action-bar">
      {secondary}
      <div className="action-bar-main">{children}</div>
    </div>
  );
}
