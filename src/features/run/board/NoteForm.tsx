import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { TextArea } from '../../../components/ui/TextArea.tsx';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { PanelActions } from './PanelActions.tsx';

interface Props {
  readonly run: BoardRun;
  readonly onBack: () => void;
}

/** A remark on a run, for whoever reads its story later. */
export function NoteForm({ run, onBack }: Props) {
  const { t } = useTranslation(['board', 'errors']);
  const { doRun, say } = useBoardTools();
  const [words, setWords] = useState('');
  const [isSent, setSent] = useState(false);
  const [submission] = useState(() => v7());
  const isEmpty = words.trim() === '';

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    setSent(true);
    if (isEmpty || !(await doRun(run.id, { event: 'note', submission, words }))) return;
    say('good', t('board:noted'));
    onBack();
  }

  return (
    <form noValidate className="grid gap-6" onSubmit={send}>
      <TextArea
        id="note"
        label={t('board:noteLabel')}
        value={words}
        maxLength={500}
        error={isSent && isEmpty ? t('errors:field.missing') : undefined}
        onChange={(event) => setWords(event.target.value)}
      />
      <PanelActions label={t('board:save')} onBack={onBack} />
    </form>
  );
}
