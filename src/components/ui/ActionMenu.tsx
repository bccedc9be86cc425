import { type FocusEvent, type KeyboardEvent, useRef } from 'react';
import { buttonClass } from './button-class.ts';
import { Icon, type IconName } from './Icon.tsx';

export interface MenuAction {
  readonly key: string;
  readonly label: string;
  readonly icon?: IconName | undefined;
  readonly onPick: () => void;
}

interface ActionMenuProps {
  /** Such as "More". */
  readonly label: string;
  readonly actions: readonly MenuAction[];
}

/** The actions beyond the two in view. Closes when one is picked, on Escape, and when the focus goes elsewhere. */
export function ActionMenu({ label, actions }: ActionMenuProps) {
  const menu = useRef<HTMLDetailsElement>(null);

  function close() {
    if (menu.current) menu.current.open = false;
  }
  function closeOnEscape(event: KeyboardEvent) {
    if (event.key !== 'Escape' || !menu.current?.open) return;
    event.stopPropagation();
    close();
    menu.current.querySelector('summary')?.focus();
  }
  function closeWhenLeft(event: FocusEvent) {
    if (!event.currentTarget.contains(event.relatedTarget)) close();
  }

  return (
    // The keys are heard from the controls inside; the element itself is no control.
    <details ref={menu} className="head-menu action-menu" onKeyDown={closeOnEscape} onBlur={closeWhenLeft}>
      <summary className={buttonClass({ kind: 'quiet' })}>
        {label}
        <Icon name="chevron-down" size={16} className="head-menu-arrow" />
      </summary>
      <div className="head-menu-sheet">
        {actions.map((action) => (
          <button
            key={action.key}
            type="button"
            className="menu-item"
            onClick={() => {
              close();
              action.onPick();
            }}
          >
            {action.icon && <Icon name={action.icon} size={20} />}
            {action.label}
          </button>
        ))}
      </div>
    </details>
  );
}
