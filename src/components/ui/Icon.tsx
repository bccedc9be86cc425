import { type IconName, iconShapes } from './icon-shapes.ts';

export type { IconName } from './icon-shapes.ts';

interface IconProps {
  readonly name: IconName;
  /** In px; the drawing is made for 24 and stays crisp at 16, 20, 32 and 48. */
  readonly size?: number | undefined;
  readonly className?: string | undefined;
}

/** A line drawing in the color of the words around it. Hidden from screen readers: the word beside it speaks. */
export function Icon({ name, size = 24, className }: IconProps) {
  return (
    <svg
      className={className ? `icon ${className}` : 'icon'}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth={2}
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      focusable="false"
    >
      <path d={iconShapes[name]} />
    </svg>
  );
}
