import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { ActionMenu, type MenuAction } from '../../../components/ui/ActionMenu.tsx';
import { Button } from '../../../components/ui/Button.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Dialog } from '../../../components/ui/Dialog.tsx';
import { JobTagSettings } from '../../../components/ui/JobTagSettings.tsx';
import type { BoardRun } from '../board.schema.ts';
import type { RunEvent } from '../run-states.ts';
import { ActualForm } from './ActualForm.tsx';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';
import { findCurrent, tagSettings, writeFigures } from './board-view.tsx';
import { HandOverForm } from './HandOverForm.tsx';
import { NoteForm } from './NoteForm.tsx';
import { ReadingForm } from './ReadingForm.tsx';
import { RunPhotos } from './RunPhotos.tsx';
import { RunStoryList } from './RunStoryList.tsx';
import { StopButton } from './StopButton.tsx';

type Mode = 'look' | 'record' | 'correct' | 'hand over' | 'note' | 'set actual';

interface Props {
  readonly run: BoardRun;
  /** Opened to be given to somebody else. */
  readonly isHandingOver?: boolean;
  readonly onClose: () => void;
}

/** Things that are done with one press and no form. */
const pressed = ['make', 'skip', 'put back', 'repeat', 'confirm', 'deny', 'send now'] as const;

/** One run: what it is set to, all that was said about it, and what can be done with it. */
export function RunPanel({ run, isHandingOver = false, onClose }: Props) {
  const { t } = useTranslation('board');
  const { board, formats, doRun, busy, fault, clearFault, say } = useBoardTools();
  const [mode, setMode] = useState<Mode>(isHandingOver ? 'hand over' : 'look');
  const may = (event: RunEvent) => run.events.includes(event);
  const back = () => {
    clearFault();
    setMode('look');
  };

  async function press(event: (typeof pressed)[number]): Promise<void> {
    const isDone = await doRun(run.id, { event, revision: run.revision, submission: v7() });
    if (!isDone) return;
    say('good', t(`done.${event}`, { run: run.number }));
    if (event === 'skip' || event === 'repeat') onClose();
  }
  const form = (key: Exclude<Mode, 'look'>): MenuAction => ({
    key,
    label: t(`do.${key}`),
    onPick: () => setMode(key),
  });
  const pressing = (key: (typeof pressed)[number]): MenuAction => ({
    key,
    label: t(`do.${key}`),
    onPick: () => void press(key),
  });
  // Only the run whose turn it is can be sent.
  const isNext = findCurrent(board.runs)?.id === run.id && board.state === 'running';
  const more = [
    ...(may('send now') && isNext ? [pressing('send now')] : []),
    ...(may('make') ? [pressing('make')] : []),
    ...(may('skip') ? [pressing('skip')] : []),
    ...(may('repeat') ? [pressing('repeat')] : []),
    ...(may('note') ? [form('note')] : []),
    ...(may('set actual') ? [form('set actual')] : []),
  ];

  return (
    <Dialog
      open
      onClose={onClose}
      title={t('run', { run: run.number })}
      closeLabel={t('close')}
      actions={board.events.includes('hold') && <StopButton onStopped={onClose} />}
    >
      <div className="grid gap-6">
        <JobTagSettings settings={tagSettings(board, run, formats)} />
        {run.warmUp && <p className="field-help">{t('warmUp')}</p>}
        {run.actual && <p className="field-help">{t('setOtherwise')}</p>}
        {mode === 'look' && (
          <>
            <dl className="board-results">
              {board.results.map((item) => (
                <div key={item.result}>
                  <dt>{item.lot === null ? item.name : t('outOf', { name: item.name, lot: item.lot })}</dt>
                  <dd className="board-figures">{writeFigures(run, item, formats) || '–'}</dd>
                </div>
              ))}
            </dl>
            {run.state === 'doubtful' && (
              <Callout
                tone="caution"
                title={t('doubtful')}
                actions={
                  may('confirm') &&
                  board.mayRun && (
                    <>
                      <Button busy={busy} onClick={() => press('deny')}>
                        {t('do.deny')}
                      </Button>
                      <Button kind="primary" busy={busy} onClick={() => press('confirm')}>
                        {t('do.confirm')}
                      </Button>
                    </>
                  )
                }
              />
            )}
            <BoardFault fault={fault} />
            <div className="button-row">
              {may('record') && (
                <Button kind="primary" icon="edit" onClick={() => setMode('record')}>
                  {t('do.record')}
                </Button>
              )}
              {may('correct') && (
                <Button icon="edit" onClick={() => setMode('correct')}>
                  {t('do.correct')}
                </Button>
              )}
              {may('put back') && (
                <Button icon="set-back" busy={busy} onClick={() => press('put back')}>
                  {t('do.put back')}
                </Button>
              )}
              {may('hand over') && (
                <Button icon="hand-over" onClick={() => setMode('hand over')}>
                  {t('do.hand over')}
                </Button>
              )}
              {more.length > 0 && <ActionMenu label={t('more')} actions={more} />}
            </div>
            <RunPhotos run={run} />
            <RunStoryList run={run} />
          </>
        )}
        {(mode === 'record' || mode === 'correct') && (
          <ReadingForm run={run} isCorrection={mode === 'correct'} onBack={back} onDone={onClose} />
        )}
        {mode === 'hand over' && <HandOverForm run={run} onBack={back} />}
        {mode === 'note' && <NoteForm run={run} onBack={back} />}
        {mode === 'set actual' && <ActualForm run={run} onBack={back} />}
      </div>
    </Dialog>
  );
}
