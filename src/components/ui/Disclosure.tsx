import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';

interface DisclosureProps {
  /** What opens, and what holds while it is closed, such as "More: step 1, no machine limits". */
  readonly summary: ReactNode;
  readonly children: ReactNode;
  readonly startsOpen?: boolean | undefined;
}

/** What most readers may leave as it is. Opens without a script, and is found by a search on the page. */
export function Disclosure({ summary, children, startsOpen }: DisclosureProps) {
  return (
    <details className="disclosure" open={startsOpen}>
      <summary>
        <Icon name="chevron-right" size={20} />
        <span>{summary}</span>
      </summary>
      <div className="disclosure-inside">{children}</div>
    </details>
  );
}
