import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { ConfirmDialog } from '../../../components/ui/ConfirmDialog.tsx';
import type { ChangeKind } from '../stretch.ts';
import { AddRun } from './AddRun.tsx';
import { useBoardTools } from './board-context.tsx';
import { isOpenRun } from './board-view.tsx';
import { ChangeDialog } from './ChangeDialog.tsx';
import { LoadReadings } from './LoadReadings.tsx';
import { TypeAll } from './TypeAll.tsx';

const offered = ['new batch', 'repair', 'long stop', 'other'] as const satisfies readonly ChangeKind[];

function Stretches() {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const later = board.stretches.filter(({ kind }) => kind !== 'start');
  if (later.length === 0) return null;
  return (
    <ul className="board-told">
      {later.map(({ n, kind, words, at }) => (
        <li key={n}>
          {words === ''
            ? t('changedAt', { what: t(`change.${kind}`), time: formats.dateTime(at) })
            : t('changedAtWith', { what: t(`change.${kind}`), words, time: formats.dateTime(at) })}
        </li>
      ))}
    </ul>
  );
}

/** What is done with the whole trial besides its runs: something changed, paper, all readings at once, ending early. */
export function BoardSide() {
  const { t } = useTranslation('board');
  const { board, doTrial, busy, say } = useBoardTools();
  const [change, setChange] = useState<ChangeKind | 'problem' | null>(null);
  const [isTyping, setTyping] = useState(false);
  const [isLoading, setLoading] = useState(false);
  const [isEnding, setEnding] = useState(false);
  const open = board.runs.filter(isOpenRun).length;
  const isBeingRun = ['running', 'paused', 'held'].includes(board.state);

  async function end(): Promise<void> {
    if (!(await doTrial({ event: 'judge', revision: board.revision }))) return;
    setEnding(false);
    say('good', t('endedEarly'));
  }

  return (
    <>
      {isTyping && open > 0 && <TypeAll onClose={() => setTyping(false)} />}
      <div className="board-side">
        {isBeingRun && (board.mayRun || board.mayRaise) && (
          <section aria-labelledby="something-changed">
            <h2 id="something-changed">{t('changedTitle')}</h2>
            <p className="text-steel">{t('changedWords')}</p>
            <div className="button-row">
              {board.mayRun &&
                offered.map((kind) => (
                  <Button key={kind} onClick={() => setChange(kind)}>
                    {t(`change.${kind}`)}
                  </Button>
                ))}
              {board.mayRaise && (
                <Button icon="caution" onClick={() => setChange('problem')}>
                  {t('problem')}
                </Button>
              )}
            </div>
            <Stretches />
          </section>
        )}
        <AddRun />
        <section aria-labelledby="on-paper">
          <h2 id="on-paper">{t('paperTitle')}</h2>
          <p className="text-steel">{t('paperWords')}</p>
          <div className="button-row">
            <ButtonLink icon="print" href={`/trials/${board.trialId}/paper`}>
              {t('print')}
            </ButtonLink>
            {board.mayRun && isBeingRun && open > 0 && (
              <>
                <Button icon="edit" onClick={() => setTyping(true)}>
                  {t('typeAll')}
                </Button>
                <Button icon="upload" onClick={() => setLoading(true)}>
                  {t('load.title')}
                </Button>
              </>
            )}
            <ButtonLink icon="download" href={`/api/trials/${board.trialId}/readings.csv`} download>
              {t('saveFile')}
            </ButtonLink>
          </div>
        </section>
        {board.events.includes('judge') && (
          <section aria-labelledby="end-early">
            <h2 id="end-early">{t('endTitle')}</h2>
            <p className="text-steel">{t('endWords')}</p>
            <div className="button-row">
              <Button icon="flag" onClick={() => setEnding(true)}>
                {t('endEarly')}
              </Button>
            </div>
          </section>
        )}
      </div>
      {isLoading && <LoadReadings onClose={() => setLoading(false)} />}
      {change && <ChangeDialog kind={change} onClose={() => setChange(null)} />}
      <ConfirmDialog
        open={isEnding}
        title={t('endAsk')}
        confirmLabel={t('endEarly')}
        cancelLabel={t('endNot')}
        closeLabel={t('close')}
        busy={busy}
        onConfirm={end}
        onCancel={() => setEnding(false)}
      >
        {t('endAskWords', { count: open })}
      </ConfirmDialog>
    </>
  );
}
