import { type ChangeEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { readSubmissionFault } from '../../../components/island/use-submission.ts';
import { Button } from '../../../components/ui/Button.tsx';
import { buttonClass } from '../../../components/ui/button-class.ts';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Dialog } from '../../../components/ui/Dialog.tsx';
import { Icon } from '../../../components/ui/Icon.tsx';
import { readingsFileCall } from '../board.queries.ts';
import type { ReadingsPreview } from '../readings-file.schema.ts';
import { useBoardTools } from './board-context.tsx';

const limitBytes = 2 * 1024 * 1024;

/** What is wrong with a file, row by row; nothing of it is kept until all is right. */
function Findings({ preview }: { readonly preview: ReadingsPreview }) {
  const { t } = useTranslation('board');
  const { fileFault, faults, faultCount, sample, rows } = preview;
  if (fileFault !== null) {
    return <Callout tone="caution" title={t(`load.fault.${fileFault}`)} live="polite" />;
  }
  if (faultCount > 0) {
    return (
      <Callout tone="caution" title={t('load.wrong', { count: faultCount })} live="polite">
        <ul className="board-told">
          {faults.map(({ line, code, text }) => (
            <li key={`${line} ${code} ${text}`}>{t(`load.row.${code}`, { line, text })}</li>
          ))}
        </ul>
      </Callout>
    );
  }
  return (
    <Callout tone="good" title={t('load.right', { count: rows })} live="polite">
      <ul className="board-told">
        {sample.map(({ run, figures }) => (
          <li key={run}>
            {t('run', { run })}: {figures.join('  ')}
          </li>
        ))}
      </ul>
    </Callout>
  );
}

/** Readings from a spreadsheet: looked at first, then kept all or none. */
export function LoadReadings({ onClose }: { readonly onClose: () => void }) {
  const { t } = useTranslation('board');
  const { board, refreshBoard, say } = useBoardTools();
  const [file, setFile] = useState<Blob | null>(null);
  const [name, setName] = useState('');
  const [preview, setPreview] = useState<ReadingsPreview | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function send(blob: Blob, digest?: string): Promise<ReadingsPreview | null> {
    setBusy(true);
    setFault(null);
    try {
      return await readingsFileCall(board.trialId, blob, digest);
    } catch (thrown) {
      const why = readSubmissionFault(thrown);
      if (why.kind === 'refused') setFault(why.problem.detail);
      else setFault(why.kind === 'offline' ? t('fault.offline') : t('fault.signedOut'));
      return null;
    } finally {
      setBusy(false);
    }
  }
  async function look({ target }: ChangeEvent<HTMLInputElement>): Promise<void> {
    const [chosen] = target.files ?? [];
    setPreview(null);
    if (!chosen) return;
    if (chosen.size > limitBytes) return setFault(t('load.tooLarge'));
    const blob = new Blob([chosen], { type: 'text/csv' });
    setFile(blob);
    setName(chosen.name);
    setPreview(await send(blob));
  }
  async function keep(): Promise<void> {
    if (!file || !preview) return;
    const kept = await send(file, preview.digest);
    if (!kept) return;
    setPreview(kept);
    await refreshBoard();
    if (kept.kept === 0) return;
    say('good', t('load.kept', { count: kept.kept }));
    onClose();
  }
  const isRight = preview !== null && preview.fileFault === null && preview.faultCount === 0;
  return (
    <Dialog
      open
      onClose={onClose}
      title={t('load.title')}
      closeLabel={t('close')}
      actions={
        <Button kind="primary" busy={busy} disabled={!isRight} onClick={keep}>
          {t('load.keep')}
        </Button>
      }
    >
      <div className="grid gap-4">
        <p>{t('load.words')}</p>
        <div className="flex flex-wrap items-center gap-3">
          <label
            className={`${buttonClass({})} has-focus-visible:outline-3 has-focus-visible:outline-petrol`}
          >
            <Icon name="paper" />
            {t('load.file')}
            <input
              id="readings-file"
              type="file"
              accept=".csv,text/csv"
              className="sr-only"
              onChange={look}
            />
          </label>
          <span>{name}</span>
        </div>
        {fault !== null && <Callout tone="caution" title={fault} live="assertive" />}
        {preview && <Findings preview={preview} />}
      </div>
    </Dialog>
  );
}
