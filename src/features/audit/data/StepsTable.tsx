import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditDataView, AuditRun } from '../audit-data-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, wholeColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly data: AuditDataView;
}

/** When each run was asked for, made and measured, with which gauge, and what is written on its parts. */
export function StepsTable({ data, ...wording }: Props) {
  const { t, formats } = wording;
  const { runs, showsNames } = data;
  const moment = (
    key: string,
    header: string,
    at: (run: AuditRun) => number | null,
  ): TableColumn<AuditRun> => ({
    key,
    header,
    cell: (run) => {
      const value = at(run);
      if (value === null) return '\u2013';
      return (
        <time className="figures whitespace-nowrap" dateTime={new Date(value).toISOString()}>
          {formats.dateTime(value)}
        </time>
      );
    },
  });
  const columns: TableColumn<AuditRun>[] = [
    wholeColumn(
      { key: 'run', header: t('audit:data.run'), rows: runs, value: ({ number }) => number },
      wording,
    ),
    moment('asked', t('audit:data.asked'), ({ askedAt }) => askedAt),
    moment('made', t('audit:data.made'), ({ madeAt }) => madeAt),
    moment('measured', t('audit:data.measured'), ({ measuredAt }) => measuredAt),
    { key: 'gauge', header: t('audit:data.gauge'), cell: ({ gauge }) => gauge ?? '\u2013' },
    { key: 'label', header: t('audit:data.label'), cell: ({ label }) => label ?? '\u2013' },
    ...(showsNames
      ? [
          { key: 'maker', header: t('audit:data.maker'), cell: ({ maker }: AuditRun) => maker ?? '\u2013' },
          {
            key: 'measurer',
            header: t('audit:data.measurer'),
            cell: ({ measurer }: AuditRun) => measurer ?? '\u2013',
          },
        ]
      : []),
  ];
  return (
    <FigureTable
      id="steps-table"
      caption={t('audit:data.steps')}
      columns={columns}
      rows={runs}
      rowKey={({ id }) => id}
      {...wording}
    />
  );
}
