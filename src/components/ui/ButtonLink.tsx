import type { ComponentProps, ReactNode } from 'react';
import { type ButtonLook, buttonClass } from './button-class.ts';
import { Icon, type IconName } from './Icon.tsx';

interface ButtonLinkProps extends ButtonLook, Omit<ComponentProps<'a'>, 'className' | 'children' | 'href'> {
  readonly href: string;
  readonly children: ReactNode;
  readonly icon?: IconName | undefined;
  /** Follows the words: an arrow to what comes next. */
  readonly iconEnd?: IconName | undefined;
}

/** Goes to another page and looks like a button; anything that changes data is a `Button` in a form. */
export function ButtonLink({ children, kind, size, wide, icon, iconEnd, ...rest }: ButtonLinkProps) {
  return (
    <a {...rest} className={buttonClass({ kind, size, wide })}>
      {icon && <Icon name={icon} />}
      {children}
      {iconEnd && <Icon name={iconEnd} />}
    </a>
  );
}
