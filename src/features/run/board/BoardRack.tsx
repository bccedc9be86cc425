import { useTranslation } from 'react-i18next';
import { JobTag } from '../../../components/ui/JobTag.tsx';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { findCurrent, tagSettings, tagStateOf, writeFigures } from './board-view.tsx';

function useFoot(): (run: BoardRun) => string {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const [main] = board.results;
  return (run) => {
    if (run.end === 'failed' || run.end === 'beyondGauge') return t(`end.${run.end}`);
    const figures = main ? writeFigures(run, main, formats) : '';
    if (figures !== '') return figures;
    if (run.warmUp) return t('warmUp');
    const who = run.state === 'made' ? (run.measurer ?? run.person) : run.person;
    const since = run.state === 'made' ? run.madeAt : run.state === 'asked' ? run.askedAt : null;
    if (!who) return '';
    return since === null ? who.name : t('since', { name: who.name, time: formats.time(since) });
  };
}

/** The runs as tags, in the order of running; on a phone the one under way comes first. */
export function BoardRack({ onOpen }: { readonly onOpen: (runId: string) => void }) {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const foot = useFoot();
  const current = findCurrent(board.runs);
  return (
    <section aria-label={t('runs')}>
      <ul className="job-rack">
        {board.runs.map((run) => {
          const state = tagStateOf(board, run);
          const more = board.settings.length - 5;
          return (
            <li key={run.id} className={run.id === current?.id ? 'board-now' : undefined}>
              <JobTag
                number={String(run.number)}
                name={t('run', { run: run.number })}
                headingLevel={2}
                state={state}
                stateWord={t(`state.${state}`)}
                settings={tagSettings(board, run, formats)}
                moreLabel={more > 0 ? t('moreSettings', { count: more }) : undefined}
                foot={foot(run)}
                current={run.id === current?.id}
                onOpen={() => onOpen(run.id)}
              />
            </li>
          );
        })}
      </ul>
    </section>
  );
}
