import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { PlannedRun } from '../../../lib/doe/index.ts';
import type { AuditFactor } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly id: string;
  readonly caption: string;
  readonly runs: readonly PlannedRun[];
  readonly factors: readonly AuditFactor[];
}

/** Every run in its order, with its place in the standard order, its coded settings and those of the dials. */
export function RunOrderTable({ id, caption, runs, factors, ...wording }: Props) {
  const { t, figures } = wording;
  const whole = (key: string, header: string, value: (run: PlannedRun) => number | null) =>
    figureColumn({ key, header, rows: runs, value, write: figures.tick }, wording);
  const has = {
    blocks: new Set(runs.map(({ block }) => block)).size > 1,
    plots: runs.some(({ wholePlot }) => wholePlot !== undefined),
  };
  const columns: TableColumn<PlannedRun>[] = [
    whole('order', t('audit:plan.order'), ({ order }) => order),
    whole('standard', t('audit:plan.standard'), ({ standard }) => standard),
    ...(has.blocks ? [whole('block', t('audit:plan.block'), ({ block }) => block)] : []),
    ...(has.plots ? [whole('plot', t('audit:plan.plot'), ({ wholePlot }) => wholePlot ?? null)] : []),
    ...factors.map(({ letter }, place) =>
      whole(`coded-${letter}`, letter, ({ coded }) => coded[place] ?? null),
    ),
    ...factors.map(
      ({ letter, name, unit }, place): TableColumn<PlannedRun> => ({
        key: `actual-${letter}`,
        header: unit ? `${name}, ${unit}` : name,
        figures: true,
        cell: ({ actual }) => {
          const value = actual[place];
          return typeof value === 'number' ? <data value={String(value)}>{figures.one(value)}</data> : value;
        },
      }),
    ),
    { key: 'group', header: t('audit:plan.group'), cell: ({ group }) => group },
  ];
  return (
    <FigureTable
      id={id}
      caption={caption}
      columns={columns}
      rows={runs}
      rowKey={({ order }) => String(order)}
      {...wording}
    />
  );
}
