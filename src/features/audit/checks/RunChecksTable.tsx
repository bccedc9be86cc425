import { listRunChecks, type RunCheck } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly model: AuditModelView;
}

/** Each run against the model. */
export function RunChecksTable({ model, ...wording }: Props) {
  const { t, figures } = wording;
  const rows = listRunChecks(model.input, model.analysis);
  const figure = (
    key: string,
    header: string,
    value: (row: RunCheck) => number | null,
    write?: (value: number) => string,
  ) => figureColumn({ key, header, rows, value, write }, wording);
  return (
    <FigureTable
      id="run-checks-table"
      showsCaption
      caption={t('audit-model:checks.table')}
      columns={[
        {
          key: 'run',
          header: t('audit:data.run'),
          rowHeader: true,
          cell: ({ place }: RunCheck) => {
            const number = model.runNumbers[place] ?? place + 1;
            return (
              <data id={`check-run-${number}`} value={String(number)}>
                {number}
              </data>
            );
          },
        },
        figure('order', t('audit:plan.order'), ({ order }) => order, figures.tick),
        figure('y', t('audit-model:checks.y'), ({ y }) => y),
        figure('fitted', t('audit-model:checks.fitted'), ({ fitted }) => fitted),
        figure('residual', t('audit-model:checks.residual'), ({ residual }) => residual),
        figure('leverage', t('audit-model:checks.leverage'), ({ leverage }) => leverage),
        figure('internal', t('audit-model:checks.internal'), (row) => row.studentizedInternal),
        figure('external', t('audit-model:checks.external'), (row) => row.studentizedExternal),
        figure('cooks', t('audit-model:checks.cooks'), ({ cooks }) => cooks),
        figure('score', t('audit-model:checks.score'), ({ score }) => score),
      ]}
      rows={rows}
      rowKey={({ place }) => String(place)}
      {...wording}
    />
  );
}
