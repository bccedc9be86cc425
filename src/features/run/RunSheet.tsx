import { Table } from '../../components/ui/Table.tsx';
import type { Formats } from '../../i18n/format.ts';
import type { Translate } from '../../i18n/translator.ts';
import { tagSettings } from './board/board-view.tsx';
import { listFigureFields } from './board/typed-figures.ts';
import type { Board, BoardRun } from './board.schema.ts';

interface Props {
  readonly board: Board;
  readonly runs: readonly BoardRun[];
  /** What is written on the parts; empty where nothing is. */
  readonly label: string;
  readonly t: Translate;
  readonly formats: Pick<Formats, 'number'>;
}

/** The open runs on paper: what to set, and a box for each number, the time, the label and remarks. */
export function RunSheet({ board, runs, label, t, formats }: Props) {
  const box = () => <span className="run-sheet-box" />;
  return (
    <Table
      id="run-sheet"
      caption={t('board:paper.title')}
      captionHidden
      rows={runs}
      rowKey={({ id }) => id}
      empty=""
      columns={[
        { key: 'run', header: t('board:runs'), rowHeader: true, figures: true, cell: ({ number }) => number },
        ...board.settings.map(({ name, unit }, place) => ({
          key: `setting-${place}`,
          header: unit === '' ? name : `${name} (${unit})`,
          figures: true,
          cell: (run: BoardRun) => tagSettings(board, run, formats)[place]?.value ?? '',
        })),
        ...listFigureFields(board.results).map(({ key, item, part }) => {
          const name = item.lot === null ? item.name : t('board:outOf', { name: item.name, lot: item.lot });
          return { key, header: item.parts > 1 ? t('board:namedPart', { name, part }) : name, cell: box };
        }),
        { key: 'made', header: t('board:paper.made'), cell: box },
        {
          key: 'label',
          header: t('board:paper.label'),
          cell: ({ number, warmUp }) => {
            if (warmUp) return t('board:warmUp');
            return label === '' ? box() : `${label} ${number}`;
          },
        },
        { key: 'remarks', header: t('board:paper.remarks'), cell: box },
      ]}
    />
  );
}
