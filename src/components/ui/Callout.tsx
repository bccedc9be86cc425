import type { ReactNode } from 'react';
import { Icon, type IconName } from './Icon.tsx';

export type CalloutTone = 'info' | 'caution' | 'stop' | 'good';

export const toneIcons: Readonly<Record<CalloutTone, IconName>> = {
  info: 'info',
  caution: 'caution',
  stop: 'stop',
  good: 'good',
};

interface CalloutProps {
  readonly tone: CalloutTone;
  readonly title?: ReactNode;
  readonly children?: ReactNode;
  /** Buttons that deal with it; they stand at the right, below on a phone. */
  readonly actions?: ReactNode;
  /** Set when it appears after the page has loaded: "polite" waits for a pause, "assertive" breaks in. */
  readonly live?: 'polite' | 'assertive' | undefined;
}

const liveRoles = { polite: 'status', assertive: 'alert' } as const;

/** What happened, what is safe, what to do. The icon and the words carry the meaning, the color only repeats it. */
export function Callout({ tone, title, children, actions, live }: CalloutProps) {
  return (
    <div className={`callout callout-${tone}`} role={live && liveRoles[live]}>
      <div className="callout-body">
        <Icon name={toneIcons[tone]} />
        <div className="min-w-0">
          {title && <p className="callout-title">{title}</p>}
          {children && <div>{children}</div>}
        </div>
      </div>
      {actions && <div className="button-row">{actions}</div>}
    </div>
  );
}
