import { type FormEvent, useEffect, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Checkbox } from '../../../components/ui/Checkbox.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import type { BoardRun } from '../board.schema.ts';
import type { RunEventInput } from '../run-event.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { writeFigures } from './board-view.tsx';
import { FigureInputs } from './FigureInputs.tsx';
import { PanelActions } from './PanelActions.tsx';
import { listFigureFields, readTypedFigures, typedFigures } from './typed-figures.ts';
import { useRefusedFields } from './use-refused-fields.tsx';

interface Props {
  readonly run: BoardRun;
  /** The run is done: other figures take the place of those, for a reason. */
  readonly isCorrection: boolean;
  readonly onBack: () => void;
  readonly onDone: () => void;
}

const ends = ['measured', 'failed', 'beyondGauge'] as const;
type End = (typeof ends)[number];

/** The readings of one run as they are typed. What is missing may come later; what is there is kept. */
export function ReadingForm({ run, isCorrection, onBack, onDone }: Props) {
  const { t } = useTranslation(['board', 'errors']);
  const { board, formats, doRun, say } = useBoardTools();
  const fields = listFigureFields(board.results);
  // As it was when the form opened: a poll must not pull a figure from under the typing.
  const [before] = useState(() => typedFigures(run));
  const [typed, setTyped] = useState(before);
  // What the form was opened on. After a refusal the reader has seen what came in meanwhile, and decides anew.
  const [seen, setSeen] = useState<number | null>(run.revision);
  const [end, setEnd] = useState<End>('measured');
  const [isAll, setAll] = useState(false);
  const [reason, setReason] = useState('');
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [submission] = useState(() => v7());
  const form = useRef<HTMLFormElement>(null);
  const refused = useRefusedFields();
  const shown = { ...refused, ...faults };
  const present = typedFigures(run);
  const isOlder = Object.keys({ ...before, ...present }).some((key) => before[key] !== present[key]);

  useEffect(() => {
    form.current?.querySelector<HTMLInputElement>('input')?.focus();
  }, []);

  function toEvent(figures: ReturnType<typeof readTypedFigures>['figures']): RunEventInput {
    const sent = { revision: seen ?? run.revision, submission, end };
    const kept = { ...sent, figures: end === 'measured' ? figures : [] };
    if (isCorrection) return { event: 'correct', ...kept, reason };
    return { event: 'record', ...kept, isAll: isAll && end === 'measured' };
  }

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    const read = readTypedFigures(fields, typed, before);
    const found: Record<string, string> = end === 'measured' ? { ...read.faults } : {};
    const [first] = fields;
    const isSilent = read.figures.length === 0 && Object.keys(found).length === 0;
    if (end === 'measured' && isSilent && !isAll && first) found[first.key] = 'missing';
    if (isCorrection && reason.trim() === '') found['reason'] = 'missing';
    setFaults(found);
    if (Object.keys(found).length > 0) {
      form.current?.querySelector<HTMLInputElement>(`#figure-${Object.keys(found)[0]}`)?.focus();
      return;
    }
    if (!(await doRun(run.id, toEvent(read.figures)))) {
      setSeen(null);
      return;
    }
    say('good', t('board:done.record', { run: run.number }));
    onDone();
  }

  return (
    <form ref={form} noValidate className="grid gap-6" onSubmit={send}>
      {isOlder && (
        <Callout tone="info" live="polite" title={t('board:meanwhile')}>
          {board.results.map((item) => writeFigures(run, item, formats)).join('; ')}
        </Callout>
      )}
      {end === 'measured' && (
        <FigureInputs
          items={board.results}
          typed={typed}
          faults={shown}
          onType={(key, text) => setTyped((present) => ({ ...present, [key]: text }))}
        />
      )}
      <Choice
        id="end"
        name="end"
        legend={t('board:howEnded')}
        options={ends.map((value) => ({ value, label: t(`board:ended.${value}`) }))}
        value={end}
        onChange={(event) => setEnd(ends.find((each) => each === event.target.value) ?? 'measured')}
      />
      {!isCorrection && end === 'measured' && fields.length > 1 && (
        <Checkbox
          id="is-all"
          label={t('board:noMore')}
          checked={isAll}
          onChange={(event) => setAll(event.target.checked)}
        />
      )}
      {isCorrection && (
        <TextInput
          id="figure-reason"
          label={t('board:reason')}
          value={reason}
          maxLength={500}
          error={shown['reason'] ? t('errors:field.missing') : undefined}
          onChange={(event) => setReason(event.target.value)}
        />
      )}
      <PanelActions label={t('board:save')} onBack={onBack} />
    </form>
  );
}
