import { useQuery } from '@tanstack/react-query';
import { useTranslation } from 'react-i18next';
import { Loading } from '../../../components/ui/Loading.tsx';
import { runStoryCall } from '../board.queries.ts';
import type { BoardRun, StoryLine } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { writeFigure } from './board-view.tsx';

function useLineWords(): (line: StoryLine) => string {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  return (line) => {
    switch (line.kind) {
      case 'text':
        return t('story.text', { name: line.to, words: line.body, way: t(`way.${line.state}`) });
      case 'reply':
        return t('story.reply', { name: line.by, words: line.body });
      case 'note':
        return t('story.note', { name: line.by, words: line.words });
      default: {
        const name = board.results[line.result]?.name ?? '';
        const figure = writeFigure(line, formats) || '–';
        const said = t('story.reading', { name, figure, by: line.by, source: t(`source.${line.source}`) });
        const state = line.state === 'counts' ? '' : ` ${t(`reading.${line.state}`)}`;
        return `${said}${state}${line.reason ? ` ${t('story.reason', { words: line.reason })}` : ''}`;
      }
    }
  };
}

/** What was texted and answered about a run, typed and noted, in its order. */
export function RunStoryList({ run }: { readonly run: BoardRun }) {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const write = useLineWords();
  // The stamp of the board: what changed anywhere on it may have changed here.
  const story = useQuery({
    queryKey: ['run story', run.id, board.stamp],
    queryFn: () => runStoryCall(run.id),
    placeholderData: (before) => before,
  });
  return (
    <section className="grid gap-2">
      <h3>{t('storyTitle')}</h3>
      {story.isPending && <Loading label={t('loading')} />}
      {story.isError && <p>{t('storyLost')}</p>}
      {story.data?.lines.length === 0 && <p className="text-steel">{t('storyEmpty')}</p>}
      <ol className="board-story">
        {story.data?.lines.map((line) => (
          <li key={`${line.kind} ${line.at} ${write(line)}`}>
            <span className="board-story-time">{formats.dateTime(line.at)}</span> {write(line)}
          </li>
        ))}
      </ol>
    </section>
  );
}
