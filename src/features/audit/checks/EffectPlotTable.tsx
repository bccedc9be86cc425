import type { EffectPlot, PlottedEffect } from '../../../lib/doe/index.ts';
import type { AuditFactor } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { nameTerm } from '../model/name-term.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly plot: EffectPlot;
  readonly factors: readonly AuditFactor[];
}

/** The figures of the half-normal plot, each effect with the limit that decides about it. */
export function EffectPlotTable({ plot, factors, ...wording }: Props) {
  const { t, figures } = wording;
  const rows = plot.effects;
  const figure = (
    key: string,
    header: string,
    value: (row: PlottedEffect) => number | null,
    write?: (value: number) => string,
  ) => figureColumn({ key, header, rows, value, write }, wording);
  return (
    <FigureTable
      id="half-normal-table"
      caption={t('audit-model:plot.title')}
      columns={[
        {
          key: 'term',
          header: t('audit-model:terms.term'),
          rowHeader: true,
          cell: ({ term }: PlottedEffect) => term,
        },
        {
          key: 'names',
          header: t('audit-model:terms.names'),
          cell: ({ term }: PlottedEffect) => nameTerm(term, factors),
        },
        figure('effect', t('audit-model:terms.effect'), ({ effect }) => effect),
        figure('size', t('audit-model:plot.size'), ({ size }) => size),
        figure('score', t('audit-model:plot.score'), ({ score }) => score),
        figure('limit', t('audit-model:plot.limit'), ({ limit }) => limit),
        figure('p', t('audit-model:terms.p'), ({ p }) => p, figures.p),
        figure('pFamily', t('audit-model:terms.pFamily'), ({ pFamily }) => pFamily, figures.p),
      ]}
      rows={rows}
      rowKey={({ term }) => term}
      {...wording}
    />
  );
}
