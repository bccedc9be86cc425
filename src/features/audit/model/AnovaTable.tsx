import type { AnovaRow } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly model: AuditModelView;
}

/** The analysis of variance by source. */
export function AnovaTable({ model, ...wording }: Props) {
  const { t, figures } = wording;
  const rows = model.analysis.anova;
  const figure = (
    key: string,
    header: string,
    value: (row: AnovaRow) => number | null,
    write?: (value: number) => string,
  ) => figureColumn({ key, header, rows, value, write }, wording);
  return (
    <FigureTable
      id="anova-table"
      caption={t('audit-model:anova.title')}
      columns={[
        {
          key: 'source',
          header: t('audit-model:anova.source'),
          rowHeader: true,
          cell: ({ source }) => t(`audit-model:anova.sources.${source}`),
        },
        figure('df', t('audit-model:terms.df'), ({ df }) => df, figures.tick),
        figure('ss', t('audit-model:terms.ss'), ({ ss }) => ss),
        figure('ms', t('audit-model:anova.ms'), ({ ms }) => ms),
        figure('f', t('audit-model:terms.f'), ({ f }) => f),
        figure('p', t('audit-model:terms.p'), ({ p }) => p, figures.p),
      ]}
      rows={rows}
      rowKey={({ source }) => source}
      {...wording}
    />
  );
}
