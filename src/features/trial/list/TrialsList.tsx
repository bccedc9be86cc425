import type { ResourceLanguage } from 'i18next';
import { useEffect, useRef } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { Button } from '../../../components/ui/Button.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { ConfirmDialog } from '../../../components/ui/ConfirmDialog.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { TrialFault } from '../TrialFault.tsx';
import type { ListTrials, PublicTrial } from '../trial.schema.ts';
import { TrialRows } from './TrialRows.tsx';
import { TrialsTable } from './TrialsTable.tsx';
import { type DoneMove, useTrialMoves } from './use-trial-moves.tsx';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly timeZone: string;
  readonly trials: readonly PublicTrial[];
  readonly list: ListTrials;
  readonly mayWrite: boolean;
}

/** What was just done; the focus comes here, as the row that was pressed is gone. */
function Done({ done, busy, onUndo }: { done: DoneMove; busy: boolean; onUndo: () => void }) {
  const { t } = useTranslation('trials');
  const undo = useRef<HTMLButtonElement>(null);
  const words = useRef<HTMLDivElement>(null);
  useEffect(() => (undo.current ?? words.current)?.focus(), []);
  const title = done.trial.title || t('untitled');
  return (
    <div ref={words} tabIndex={-1} className="outline-none">
      <Callout
        tone="good"
        live="polite"
        actions={
          done.kind !== 'deleted' && (
            <Button ref={undo} busy={busy} busyLabel={t('undoing')} onClick={onUndo}>
              {t('undo')}
            </Button>
          )
        }
      >
        {t(`done.${done.kind}`, { title })}
      </Callout>
    </div>
  );
}

function List({ language, timeZone, trials: first, list, mayWrite }: Omit<Props, 'words'>) {
  const { t } = useTranslation('trials');
  const { trials, done, asked, busy, fault, moves, undo, remove, stopAsking } = useTrialMoves(first);
  const formats = formatsFor(language, timeZone);
  const shown = { trials, list, formats, moves: mayWrite ? moves : null };
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
      <TrialFault fault={fault} />
      {done && <Done key={`${done.kind} ${done.trial.id}`} done={done} busy={busy} onUndo={undo} />}
      <div className="trials-table hidden lg:block">
        <TrialsTable {...shown} />
      </div>
      <div className="lg:hidden">
        <TrialRows {...shown} />
      </div>
      <ConfirmDialog
        open={asked !== null}
        title={t('deleteTitle', { title: asked?.title || t('untitled') })}
        confirmLabel={t('deleteNow')}
        busyLabel={t('deleting')}
        cancelLabel={t('cancel')}
        closeLabel={t('close')}
        kind="stop"
        busy={busy}
        onConfirm={remove}
        onCancel={stopAsking}
      >
        {t('deleteWords')}
      </ConfirmDialog>
    </div>
  );
}

/** One page of the shop's trials, with what can be done to each. */
export function TrialsList({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <List language={language} {...rest} />
    </IslandRoot>
  );
}
