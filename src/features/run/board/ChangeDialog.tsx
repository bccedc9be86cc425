import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { Dialog } from '../../../components/ui/Dialog.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import type { ChangeKind } from '../stretch.ts';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';

interface Props {
  readonly kind: ChangeKind | 'problem';
  readonly onClose: () => void;
}

/** Something changed under the trial, or went wrong: in a few words, so that the verdict can take it into account. */
export function ChangeDialog({ kind, onClose }: Props) {
  const { t } = useTranslation(['board', 'errors']);
  const { doTrial, busy, fault, say } = useBoardTools();
  const [words, setWords] = useState('');
  const [isSent, setSent] = useState(false);
  const [id] = useState(() => v7());
  // What a new batch or something else is cannot be guessed; a repair or a long stop says enough by itself.
  const isMissing = words.trim() === '' && kind !== 'repair' && kind !== 'long stop';

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    setSent(true);
    if (isMissing) return;
    const isDone = await doTrial(
      kind === 'problem'
        ? { event: 'raise a problem', id, words }
        : { event: 'something changed', kind, words },
    );
    if (!isDone) return;
    say('good', kind === 'problem' ? t('board:problemKept') : t('board:changeKept'));
    onClose();
  }

  return (
    <Dialog open onClose={onClose} title={t(`board:changeAsk.${kind}`)} closeLabel={t('board:close')}>
      <form noValidate className="grid gap-6 pb-6" onSubmit={send}>
        <TextInput
          id="change-words"
          label={t(`board:changeLabel.${kind}`)}
          value={words}
          maxLength={kind === 'problem' ? 500 : 200}
          error={isSent && isMissing ? t('errors:field.missing') : undefined}
          data-first-focus
          onChange={(event) => setWords(event.target.value)}
        />
        <BoardFault fault={fault} />
        <div className="button-row justify-end">
          <Button kind="primary" type="submit" busy={busy} busyLabel={t('board:saving')}>
            {t('board:save')}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
