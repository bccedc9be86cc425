import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';

interface QuestionFrameProps {
  /** The question with its fields and its `ActionBar`. */
  readonly children: ReactNode;
  /** What is known so far. */
  readonly side?: ReactNode;
  /** Names the side column for a screen reader. */
  readonly sideLabel: string;
  /** The side in one line, for a phone; a tap opens the rest. */
  readonly sideLine?: ReactNode;
}

/** A question of 640 px with "so far" of 320 px beside it, which stays in view; on a phone it is one line above. */
export function QuestionFrame({ children, side, sideLabel, sideLine }: QuestionFrameProps) {
  return (
    <div className="question-frame">
      <details className="question-side-line">
        <summary>
          <span>{sideLine}</span>
          <Icon name="chevron-down" size={20} />
        </summary>
        <div className="question-side-inside">{side}</div>
      </details>
      <div className="question-main">{children}</div>
      <aside className="question-side" aria-label={sideLabel}>
        {side}
      </aside>
    </div>
  );
}
