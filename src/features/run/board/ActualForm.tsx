import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Choice } from '../../../components/ui/Choice.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { parseTypedNumber } from '../../../i18n/format.ts';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { PanelActions } from './PanelActions.tsx';

interface Props {
  readonly run: BoardRun;
  readonly onBack: () => void;
  /** What follows once the values are kept. */
  readonly onSaved?: () => Promise<void>;
}

/** What the dials were really set to, setting by setting. */
export function ActualForm({ run, onBack, onSaved }: Props) {
  const { t } = useTranslation(['board', 'errors']);
  const { board, doRun, say } = useBoardTools();
  const [typed, setTyped] = useState(() => (run.actual ?? run.planned).map(String));
  const [isSent, setSent] = useState(false);
  const values = board.settings.map(({ kind }, place) => {
    const text = typed[place] ?? '';
    return kind === 'number' ? parseTypedNumber(text) : text;
  });
  const type = (place: number, text: string) =>
    setTyped((present) => present.map((each, index) => (index === place ? text : each)));

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    setSent(true);
    const actual = values.filter((value) => value !== null);
    if (actual.length < values.length) return;
    const { revision } = run;
    if (!(await doRun(run.id, { event: 'set actual', revision, submission: v7(), actual }))) return;
    await onSaved?.();
    say('good', t('board:actualKept', { run: run.number }));
    onBack();
  }

  return (
    <form noValidate className="grid gap-6" onSubmit={send}>
      <p>{t('board:actualWords')}</p>
      {board.settings.map((setting, place) =>
        setting.kind === 'number' ? (
          <NumberInput
            key={setting.name}
            id={`actual-${place}`}
            label={setting.name}
            unit={setting.unit === '' ? undefined : setting.unit}
            value={typed[place] ?? ''}
            error={isSent && values[place] === null ? t('errors:field.not-a-number') : undefined}
            onChange={(event) => type(place, event.target.value)}
          />
        ) : (
          <Choice
            key={setting.name}
            id={`actual-${place}`}
            name={`actual-${place}`}
            legend={setting.name}
            options={[setting.low, setting.high].map((name) => ({
              value: String(name),
              label: String(name),
            }))}
            value={typed[place] ?? ''}
            onChange={(event) => type(place, event.target.value)}
          />
        ),
      )}
      <PanelActions label={t('board:save')} onBack={onBack} />
    </form>
  );
}
