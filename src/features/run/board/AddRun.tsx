import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import type { AddedRunKind } from '../added-run.ts';
import { useBoardTools } from './board-context.tsx';

/** A run before the next one: a warm-up on a cold machine, or a middle run after a long stop. */
export function AddRun() {
  const { t } = useTranslation('board');
  const { board, doTrial, busy, say } = useBoardTools();
  const waits = board.runs.some(({ state }) => state === 'waiting');
  if (!board.mayRun || !waits || !['running', 'paused', 'held'].includes(board.state)) return null;
  const hasMiddle = board.runs.some(({ center, warmUp }) => center && !warmUp);

  async function add(kind: AddedRunKind): Promise<void> {
    if (await doTrial({ event: 'add a run', id: v7(), kind })) say('good', t(`added.${kind}`));
  }
  return (
    <section aria-labelledby="before-next">
      <h2 id="before-next">{t('addTitle')}</h2>
      <p className="text-steel">{t('addWords')}</p>
      <div className="button-row">
        <Button icon="plus" busy={busy} onClick={() => add('warm-up')}>
          {t('add.warm-up')}
        </Button>
        {hasMiddle && (
          <Button icon="plus" busy={busy} onClick={() => add('middle')}>
            {t('add.middle')}
          </Button>
        )}
      </div>
    </section>
  );
}
