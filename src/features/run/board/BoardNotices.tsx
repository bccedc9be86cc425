import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import type { Board } from '../board.schema.ts';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';
import { findCurrent } from './board-view.tsx';
import { ResumeDialog } from './ResumeDialog.tsx';

interface Props {
  /** When the board was last right; null while it is. */
  readonly lostSince: number | null;
  /** A panel shows its own faults. */
  readonly isPanelOpen: boolean;
}

function ProblemNotice({ problem }: { readonly problem: Board['problems'][number] }) {
  const { t } = useTranslation('board');
  const { board, formats, doTrial, doRun, busy } = useBoardTools();
  const [isSettling, setSettling] = useState(false);
  const run = board.runs.find(({ id }) => id === problem.runId);
  const values = { name: problem.by, words: problem.words, time: formats.time(problem.at) };
  return (
    <Callout
      tone="caution"
      live="assertive"
      title={
        problem.runNumber === null
          ? t('problemOfTrial', values)
          : t('problemOfRun', { ...values, run: problem.runNumber })
      }
      actions={
        board.mayRun && (
          <>
            {run?.events.includes('skip') && (
              <Button
                icon="skip"
                busy={busy}
                onClick={() => doRun(run.id, { event: 'skip', revision: run.revision, submission: v7() })}
              >
                {t('skipRun', { run: run.number })}
              </Button>
            )}
            <Button kind="primary" icon="tick" busy={busy} onClick={() => setSettling(true)}>
              {t('settled')}
            </Button>
          </>
        )
      }
    >
      {t('problemWaits')}
      {isSettling && (
        <ResumeDialog
          needsReason={false}
          onClose={() => setSettling(false)}
          onSend={async ({ change }) => {
            const event = { event: 'settle a problem', problemId: problem.id } as const;
            const isDone = await doTrial(change ? { ...event, change } : event);
            if (isDone) setSettling(false);
          }}
        />
      )}
    </Callout>
  );
}

function StopNotice() {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const { stop } = board;
  const told = stop?.told ?? [];
  return (
    <Callout
      tone="stop"
      live="assertive"
      title={stop ? t('stoppedAt', { time: formats.time(stop.at) }) : t('stoppedNow')}
    >
      {told.length === 0 ? (
        <p>{t('toldNobody')}</p>
      ) : (
        <ul className="board-told">
          {told.map(({ name, text, answeredAt }) => (
            <li key={name}>
              {answeredAt === null
                ? t(`told.${text}`, { name })
                : t('toldAnswered', { name, time: formats.time(answeredAt) })}
            </li>
          ))}
        </ul>
      )}
      <p>{board.resumeByReviewer ? t('resumeByReviewer') : t('resumeWithReason')}</p>
    </Callout>
  );
}

function FirstRunNotice() {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  const isUntouched = board.runs.every(({ state }) => state === 'waiting');
  const first = findCurrent(board.runs);
  if (board.state !== 'running' || !isUntouched || !first) return null;
  const name = first.person?.name;
  return (
    <Callout tone="info" title={t('noneOut')}>
      {name === undefined ? t('firstForCrew') : t('firstFor', { name })}
    </Callout>
  );
}

function EndNotice() {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  if (['running', 'paused', 'held'].includes(board.state)) return null;
  const isMaking = board.state === 'readings in';
  return (
    <Callout
      tone="good"
      title={t('allIn')}
      actions={
        !isMaking && (
          <ButtonLink kind="primary" href={`/trials/${board.trialId}/verdict`} iconEnd="arrow-right">
            {t('toVerdict')}
          </ButtonLink>
        )
      }
    >
      {isMaking ? t('verdictSoon') : t('verdictThere')}
    </Callout>
  );
}

/** What must be seen before the runs: not live, stopped, problems, the end. Each stays until it is dealt with. */
export function BoardNotices({ lostSince, isPanelOpen }: Props) {
  const { t } = useTranslation('board');
  const { board, fault, formats } = useBoardTools();
  return (
    <div className="board-notices">
      {lostSince !== null && (
        <Callout tone="caution" title={t('notLive', { time: formats.time(lostSince) })} live="assertive">
          {t('notLiveWords')}
        </Callout>
      )}
      {board.state === 'held' && <StopNotice />}
      {board.state === 'paused' && (
        <Callout tone="info" title={t('pausedTitle')}>
          {t('pausedWords')}
        </Callout>
      )}
      {board.problems.map((problem) => (
        <ProblemNotice key={problem.id} problem={problem} />
      ))}
      {!isPanelOpen && <BoardFault fault={fault} />}
      <FirstRunNotice />
      <EndNotice />
    </div>
  );
}
