export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'stop';

export interface ButtonLook {
  /** `primary` at most once a view; `stop` only for what stops a machine or cannot be undone. */
  readonly kind?: ButtonKind | undefined;
  /** `large` is 56 px high: safety, and the main action of a phone page. */
  readonly size?: 'regular' | 'large' | undefined;
  /** Full width always, or only where the thumb is. */
  readonly wide?: 'always' | 'phone' | undefined;
}

/** The classes of a button, for what cannot be a `Button` or `ButtonLink`, such as a `summary`. */
export function buttonClass({ kind = 'secondary', size = 'regular', wide }: ButtonLook): string {
  const classes = ['button', `button-${kind}`];
  if (size === 'large') classes.push('button-large');
  if (wide === 'always') classes.push('button-wide');
  if (wide === 'phone') classes.push('button-wide-phone');
  return classes.join(' ');
}
