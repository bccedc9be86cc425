import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Select } from '../../../components/ui/Select.tsx';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { PanelActions } from './PanelActions.tsx';

interface Props {
  readonly run: BoardRun;
  readonly onBack: () => void;
}

/** Gives a run to somebody else of the crew. */
export function HandOverForm({ run, onBack }: Props) {
  const { t } = useTranslation('board');
  const { board, doRun, say } = useBoardTools();
  const holder = run.state === 'made' ? (run.measurer ?? run.person) : run.person;
  const others = board.crew.filter(({ id }) => id !== holder?.id);
  const [personId, setPersonId] = useState(others[0]?.id ?? '');

  async function send(event: FormEvent): Promise<void> {
    event.preventDefault();
    const { revision } = run;
    if (!(await doRun(run.id, { event: 'hand over', revision, submission: v7(), personId }))) return;
    const name = others.find(({ id }) => id === personId)?.name ?? '';
    say('good', t('handedTo', { run: run.number, name }));
    onBack();
  }

  if (others.length === 0) return <p>{t('nobodyElse')}</p>;
  return (
    <form noValidate className="grid gap-6" onSubmit={send}>
      <Select
        id="hand-to"
        label={run.state === 'made' ? t('measuredBy') : t('madeBy')}
        options={others.map(({ id, name }) => ({ value: id, label: name }))}
        value={personId}
        onChange={(event) => setPersonId(event.target.value)}
      />
      <PanelActions label={t('do.hand over')} onBack={onBack} />
    </form>
  );
}
