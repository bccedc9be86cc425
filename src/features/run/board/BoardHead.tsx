import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { useBoardTools } from './board-context.tsx';
import { isOpenRun } from './board-view.tsx';
import { ResumeDialog } from './ResumeDialog.tsx';
import { StopButton } from './StopButton.tsx';

function useLeft(): string | null {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  const open = board.runs.filter(isOpenRun).length;
  if (open === 0 || board.minutesPerRun === null) return null;
  const minutes = open * board.minutesPerRun;
  if (minutes < 90) return t('left.minutes', { count: Math.max(5, Math.round(minutes / 5) * 5) });
  return t('left.hours', { count: Math.round(minutes / 60) });
}

/** Where the trial stands, with what stops it always in view. */
export function BoardHead() {
  const { t } = useTranslation('board');
  const { board, doTrial, busy, say } = useBoardTools();
  const [isResuming, setResuming] = useState(false);
  const left = useLeft();
  const done = board.runs.filter(({ state }) => state === 'done').length;
  const may = (event: (typeof board.events)[number]) => board.events.includes(event);

  async function pause(): Promise<void> {
    if (await doTrial({ event: 'pause', revision: board.revision })) say('good', t('pausedNow'));
  }

  return (
    <div className="board-head">
      <div className="board-head-words">
        <h1>{board.title}</h1>
        <p className="page-head-note" aria-live="polite">
          {t('progress', { done, count: board.runs.length })}
          {left && <> · {left}</>}
          {board.texts.sent > 0 && (
            <>
              {' '}
              · {t('texts', { count: board.texts.sent, parts: t('textParts', { count: board.texts.parts }) })}
            </>
          )}
        </p>
      </div>
      <div className="board-head-actions">
        {may('pause') && (
          <Button icon="pause" busy={busy} onClick={pause}>
            {t('pause')}
          </Button>
        )}
        {may('resume') && (
          <Button icon="play" busy={busy} onClick={() => setResuming(true)}>
            {t('resume')}
          </Button>
        )}
        <StopButton />
      </div>
      {isResuming && (
        <ResumeDialog
          needsReason={board.state === 'held'}
          onClose={() => setResuming(false)}
          onSend={async ({ reason, change }) => {
            const event = { event: 'resume', revision: board.revision, id: v7(), reason } as const;
            const isDone = await doTrial(change ? { ...event, change } : event);
            if (isDone) setResuming(false);
          }}
        />
      )}
    </div>
  );
}
