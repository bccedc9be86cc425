import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';
import { findCurrent, usualLine } from './board-view.tsx';
import { ProblemNotice } from './ProblemNotice.tsx';
import { StopNotice } from './StopNotice.tsx';

interface Props {
  /** When the board was last right; null while it is. */
  readonly lostSince: number | null;
  /** A panel shows its own faults. */
  readonly isPanelOpen: boolean;
  /** Opens a run where it can be given to somebody else. */
  readonly onHandOver: (runId: string) => void;
}

function FirstRunNotice() {
  const { t } = useTranslation('board');
  const { board, doRun, busy } = useBoardTools();
  const isUntouched = board.runs.every(({ state }) => state === 'waiting');
  const first = findCurrent(board.runs);
  if (board.state !== 'running' || !isUntouched || !first) return null;
  const name = first.person?.name;
  return (
    <Callout
      tone="info"
      title={t('noneOut')}
      actions={
        first.events.includes('send now') && (
          <Button
            icon="send"
            busy={busy}
            onClick={() => doRun(first.id, { event: 'send now', revision: first.revision, submission: v7() })}
          >
            {t('sendNow')}
          </Button>
        )
      }
    >
      {name === undefined ? t('firstForCrew') : t('firstFor', { name })}
    </Callout>
  );
}

/** After a stop or an end somebody must put the machine back; it stays here until somebody says so. */
function SetBackNotice() {
  const { t } = useTranslation('board');
  const { board, formats, doTrial, busy, say } = useBoardTools();
  if (board.setBack !== 'asked') return null;

  async function confirm(): Promise<void> {
    if (await doTrial({ event: 'back to usual' })) say('good', t('backKept'));
  }
  return (
    <Callout
      tone="caution"
      title={t('notBack')}
      actions={
        board.mayRun && (
          <Button icon="set-back" busy={busy} onClick={confirm}>
            {t('isBack')}
          </Button>
        )
      }
    >
      {t('notBackWords', { settings: usualLine(board, formats) })}
    </Callout>
  );
}

/** The shop's texts of this month are nearly or quite used up. */
function MonthNotice() {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  const { month } = board.texts;
  if (month === null || month.standing === 'enough') return null;
  return (
    <Callout tone="caution" title={t(`month.${month.standing}`, { used: month.used, limit: month.limit })}>
      {t(`monthWords.${month.standing}`)}
    </Callout>
  );
}

/** Runs for which no answer will come by itself. */
function UnansweredNotices({ onHandOver }: { readonly onHandOver: (runId: string) => void }) {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  return board.runs.map((run) => {
    if (run.unanswered === null) return null;
    const holder = run.state === 'made' ? (run.measurer ?? run.person) : run.person;
    return (
      <Callout
        key={run.id}
        tone="caution"
        live="polite"
        title={t(`unanswered.${run.unanswered}`, { run: run.number, name: holder?.name ?? '' })}
        actions={
          board.mayRun && (
            <>
              {run.events.includes('hand over') && (
                <Button icon="hand-over" onClick={() => onHandOver(run.id)}>
                  {t('do.hand over')}
                </Button>
              )}
              <ButtonLink icon="paper" href={`/trials/${board.trialId}/paper`}>
                {t('usePaper')}
              </ButtonLink>
            </>
          )
        }
      >
        {t('unansweredWords')}
      </Callout>
    );
  });
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
export function BoardNotices({ lostSince, isPanelOpen, onHandOver }: Props) {
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
      <UnansweredNotices onHandOver={onHandOver} />
      {!isPanelOpen && <BoardFault fault={fault} />}
      <MonthNotice />
      <FirstRunNotice />
      <SetBackNotice />
      <EndNotice />
    </div>
  );
}
