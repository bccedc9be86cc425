import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { Dialog } from '../../../components/ui/Dialog.tsx';
import { TextArea } from '../../../components/ui/TextArea.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import type { ChangeKind } from '../stretch.ts';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';

interface Answer {
  reason: string;
  change: { kind: ChangeKind; words: string } | null;
}

interface Props {
  readonly needsReason: boolean;
  readonly onClose: () => void;
  readonly onSend: (answer: Answer) => Promise<void>;
}

/** Before a trial goes on: why that is safe, and whether anything was repaired or changed meanwhile. */
export function ResumeDialog({ needsReason, onClose, onSend }: Props) {
  const { t } = useTranslation('board');
  const { busy, fault } = useBoardTools();
  const [reason, setReason] = useState('');
  const [changed, setChanged] = useState<'no' | 'yes'>('no');
  const [words, setWords] = useState('');
  const [isSent, setSent] = useState(false);
  const lacksReason = needsReason && reason.trim() === '';

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    setSent(true);
    if (lacksReason) return;
    const change = changed === 'yes' ? { kind: 'repair' as const, words } : null;
    await onSend({ reason, change });
  }

  return (
    <Dialog open onClose={onClose} title={t('resumeTitle')} closeLabel={t('close')}>
      <form noValidate className="grid gap-6 pb-6" onSubmit={send}>
        {needsReason && (
          <TextArea
            id="resume-reason"
            label={t('resumeReason')}
            value={reason}
            maxLength={500}
            error={isSent && lacksReason ? t('resumeReasonMissing') : undefined}
            onChange={(event) => setReason(event.target.value)}
          />
        )}
        <Choice
          id="resume-changed"
          name="resume-changed"
          legend={t('resumeChanged')}
          options={[
            { value: 'no', label: t('no') },
            { value: 'yes', label: t('yes') },
          ]}
          value={changed}
          onChange={(event) => setChanged(event.target.value === 'yes' ? 'yes' : 'no')}
        />
        {changed === 'yes' && (
          <TextInput
            id="resume-words"
            label={t('whatChanged')}
            value={words}
            maxLength={200}
            onChange={(event) => setWords(event.target.value)}
          />
        )}
        <BoardFault fault={fault} />
        <div className="button-row justify-end">
          <Button kind="primary" type="submit" icon="play" busy={busy}>
            {t('resumeNow')}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
