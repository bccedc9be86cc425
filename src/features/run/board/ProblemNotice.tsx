import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import type { Board } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { CannotActions } from './CannotActions.tsx';
import { ResumeDialog } from './ResumeDialog.tsx';

type Problem = Board['problems'][number];

/** What happened and what it means, in the words of its kind. */
function useProblemWords(problem: Problem): { title: string; words: string } {
  const { t } = useTranslation('board');
  const { formats } = useBoardTools();
  const { kind, runNumber, by, words } = problem;
  const values = { name: by, words, time: formats.time(problem.at), run: runNumber ?? '' };
  switch (kind) {
    case 'stop':
      return { title: t('stopTitle', values), words: t('stopWords') };
    case 'danger':
      return { title: t('dangerTitle', values), words: t('dangerWords') };
    case 'cannot':
      return { title: t('cannotTitle', values), words: t('cannotWords') };
    case 'late':
      return { title: t('lateTitle', values), words: t('lateWords') };
    case 'unread':
      return { title: t('unreadTitle', values), words: t('unreadWords') };
    default:
      return {
        title: runNumber === null ? t('problemOfTrial', values) : t('problemOfRun', values),
        words: t('problemWaits'),
      };
  }
}

/** Something that tops the board until somebody deals with it. */
export function ProblemNotice({ problem }: { readonly problem: Problem }) {
  const { t } = useTranslation('board');
  const { board, doTrial, doRun, busy } = useBoardTools();
  const [isSettling, setSettling] = useState(false);
  const { title, words } = useProblemWords(problem);
  const run = board.runs.find(({ id }) => id === problem.runId);
  const isCannot = problem.kind === 'cannot' && run !== undefined;

  return (
    <Callout
      tone={problem.kind === 'danger' || problem.kind === 'stop' ? 'stop' : 'caution'}
      live="assertive"
      title={title}
      actions={
        board.mayRun &&
        (isCannot ? (
          <CannotActions run={run} problemId={problem.id} />
        ) : (
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
        ))
      }
    >
      {words}
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
