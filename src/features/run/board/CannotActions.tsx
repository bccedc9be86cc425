import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Dialog } from '../../../components/ui/Dialog.tsx';
import type { BoardRun } from '../board.schema.ts';
import type { CannotDecision } from '../cannot-decision.ts';
import { ActualForm } from './ActualForm.tsx';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';

interface Props {
  readonly run: BoardRun;
  readonly problemId: string;
}

/** What to do with a run whose setting cannot be reached. With what was reached, the real settings are typed first. */
export function CannotActions({ run, problemId }: Props) {
  const { t } = useTranslation('board');
  const { doTrial, busy, fault } = useBoardTools();
  const [isTyping, setTyping] = useState(false);

  async function decide(decision: CannotDecision): Promise<void> {
    await doTrial({ event: 'settle a problem', problemId, decision });
  }
  return (
    <>
      <Button busy={busy} onClick={() => decide('rule out')}>
        {t('cannot.rule out')}
      </Button>
      <Button busy={busy} onClick={() => decide('later')}>
        {t('cannot.later')}
      </Button>
      <Button kind="primary" busy={busy} onClick={() => setTyping(true)}>
        {t('cannot.use')}
      </Button>
      {isTyping && (
        <Dialog open onClose={() => setTyping(false)} title={t('cannot.use')} closeLabel={t('close')}>
          <BoardFault fault={fault} />
          <ActualForm run={run} onBack={() => setTyping(false)} onSaved={() => decide('use')} />
        </Dialog>
      )}
    </>
  );
}
