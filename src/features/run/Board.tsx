import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Toast, ToastList } from '../../components/ui/Toast.tsx';
import { useToasts } from '../../components/ui/use-toasts.ts';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { BoardHead } from './board/BoardHead.tsx';
import { BoardNotices } from './board/BoardNotices.tsx';
import { BoardRack } from './board/BoardRack.tsx';
import { BoardSide } from './board/BoardSide.tsx';
import { BoardContext, type BoardTools } from './board/board-context.tsx';
import { RunPanel } from './board/RunPanel.tsx';
import { useBoard } from './board/use-board.tsx';
import { boardEventCall, runEventCall } from './board.queries.ts';
import type { Board as BoardData } from './board.schema.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly timeZone: string;
  readonly first: BoardData;
}

/** The live board of a running trial. */
export function Board({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <LiveBoard language={language} {...rest} />
    </IslandRoot>
  );
}

function LiveBoard({ language, timeZone, first }: Omit<Props, 'words'>) {
  const { t } = useTranslation('board');
  const { board, lostSince, refresh } = useBoard(first);
  const { busy, fault, submit, clearFault } = useSubmission();
  const { toasts, show, close } = useToasts();
  const [openRun, setOpenRun] = useState<string | null>(null);
  const [isHandingOver, setHandingOver] = useState(false);
  const run = board.runs.find(({ id }) => id === openRun);

  async function send(work: () => Promise<unknown>): Promise<boolean> {
    let isDone = false;
    await submit(async () => {
      await work();
      isDone = true;
    });
    // What was refused may have changed under the reader's hands: they see the present state beside the refusal.
    await refresh();
    return isDone;
  }
  const tools: BoardTools = {
    board,
    formats: formatsFor(language, timeZone),
    doTrial: (event) => send(() => boardEventCall(board.trialId, event)),
    doRun: (runId, event) => send(() => runEventCall(runId, event)),
    refreshBoard: refresh,
    busy,
    fault,
    clearFault,
    say: show,
  };

  return (
    <BoardContext value={tools}>
      <div className="board">
        <BoardHead />
        <BoardNotices
          lostSince={lostSince}
          isPanelOpen={run !== undefined}
          onHandOver={(id) => {
            clearFault();
            setOpenRun(id);
            setHandingOver(true);
          }}
        />
        <BoardRack
          onOpen={(id) => {
            clearFault();
            setOpenRun(id);
            setHandingOver(false);
          }}
        />
        <BoardSide />
      </div>
      {run && (
        <RunPanel key={run.id} run={run} isHandingOver={isHandingOver} onClose={() => setOpenRun(null)} />
      )}
      <ToastList label={t('notices')}>
        {toasts.map(({ id, tone, words }) => (
          <Toast key={id} tone={tone} closeLabel={t('close')} onClose={() => close(id)}>
            {words}
          </Toast>
        ))}
      </ToastList>
    </BoardContext>
  );
}
