import type { PowerAtSize } from '../../../lib/doe/index.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly power: readonly PowerAtSize[];
}

/** How often an effect of a size would be found, alone and judged with all others. */
export function PowerTable({ power, ...wording }: Props) {
  const { t, figures } = wording;
  const columns = [
    figureColumn(
      {
        key: 'size',
        header: t('audit:plan.size'),
        rows: power,
        value: ({ size }) => size,
        write: figures.tick,
      },
      wording,
    ),
    figureColumn(
      {
        key: 'likely',
        header: t('audit:plan.powerLikely'),
        rows: power,
        value: ({ likely }) => likely,
        write: figures.p,
      },
      wording,
    ),
    figureColumn(
      {
        key: 'clear',
        header: t('audit:plan.powerClear'),
        rows: power,
        value: ({ clear }) => clear,
        write: figures.p,
      },
      wording,
    ),
  ];
  return (
    <FigureTable
      id="power-table"
      caption={t('audit:plan.power')}
      columns={columns}
      rows={power}
      rowKey={({ size }) => String(size)}
      {...wording}
    />
  );
}
