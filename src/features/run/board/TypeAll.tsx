import { type ClipboardEvent, type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { readSubmissionFault } from '../../../components/island/use-submission.ts';
import { Button } from '../../../components/ui/Button.tsx';
import { fieldSentence } from '../../../i18n/field-codes.ts';
import { runEventCall } from '../board.queries.ts';
import { useBoardTools } from './board-context.tsx';
import { isOpenRun } from './board-view.tsx';
import { TypeAllTable } from './TypeAllTable.tsx';
import { listFigureFields, readPastedCells, readTypedFigures, typedFigures } from './typed-figures.ts';

type Typed = Record<string, Record<string, string>>;

/** Every open run in one table, for whoever comes with a sheet of paper or a spreadsheet. Each row is kept by itself. */
export function TypeAll({ onClose }: { readonly onClose: () => void }) {
  const { t } = useTranslation(['board', 'errors']);
  const { board, say, refreshBoard } = useBoardTools();
  const fields = listFigureFields(board.results);
  const runs = board.runs.filter(isOpenRun);
  const [typed, setTyped] = useState<Typed>({});
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [busy, setBusy] = useState(false);

  function type(runId: string, key: string, text: string): void {
    setTyped((present) => ({ ...present, [runId]: { ...present[runId], [key]: text } }));
  }

  /** Fills from the cell where it was pasted, to the right and down. */
  function paste(event: ClipboardEvent, at: { row: number; column: number }): void {
    const cells = readPastedCells(event.clipboardData.getData('text'));
    if (!cells) return;
    event.preventDefault();
    cells.forEach((row, down) => {
      const run = runs[at.row + down];
      row.forEach((text, right) => {
        const field = fields[at.column + right];
        if (run && field) type(run.id, field.key, text);
      });
    });
  }

  async function saveRun(run: (typeof runs)[number]): Promise<string | null> {
    const read = readTypedFigures(fields, typed[run.id] ?? {}, typedFigures(run));
    const [fault] = Object.values(read.faults);
    if (fault !== undefined) return fieldSentence(t, fault);
    if (read.figures.length === 0) return null;
    // Each row that is kept sends the next run out, which changes that run: the sheet stands all the same.
    const sheet = { submission: v7(), source: 'paper' as const, figures: read.figures };
    try {
      await runEventCall(run.id, { event: 'record', ...sheet });
      setTyped(({ [run.id]: __, ...rest }) => rest);
      return null;
    } catch (thrown) {
      const why = readSubmissionFault(thrown);
      if (why.kind === 'refused') return why.problem.errors[0]?.detail ?? why.problem.detail;
      return why.kind === 'offline' ? t('board:fault.offline') : t('board:fault.signedOut');
    }
  }

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    setBusy(true);
    const found: Record<string, string> = {};
    for (const run of runs) {
      const fault = await saveRun(run);
      if (fault !== null) found[run.id] = fault;
    }
    setFaults(found);
    setBusy(false);
    await refreshBoard();
    if (Object.keys(found).length === 0) {
      say('good', t('board:allKept'));
      onClose();
    }
  }

  return (
    <form noValidate className="sheet grid gap-4" onSubmit={send}>
      <h2>{t('board:typeAll')}</h2>
      <p className="text-steel">{t('board:typeAllWords')}</p>
      <TypeAllTable {...{ runs, fields, typed, faults }} onType={type} onPaste={paste} />
      <div className="button-row justify-end">
        <Button onClick={onClose}>{t('board:back')}</Button>
        <Button kind="primary" type="submit" busy={busy} busyLabel={t('board:saving')}>
          {t('board:saveAll')}
        </Button>
      </div>
    </form>
  );
}
