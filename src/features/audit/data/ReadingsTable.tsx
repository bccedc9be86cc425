import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditDataView, AuditReading } from '../audit-data-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn, wholeColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly data: AuditDataView;
}

/** Every reading that ever came in, replaced ones too: rows are only added. */
export function ReadingsTable({ data, ...wording }: Props) {
  const { t, figures, formats } = wording;
  const { readings, showsNames } = data;
  const hasLots = readings.some(({ lot }) => lot !== null);
  const columns: TableColumn<AuditReading>[] = [
    wholeColumn(
      { key: 'run', header: t('audit:data.run'), rows: readings, value: ({ runNumber }) => runNumber },
      wording,
    ),
    {
      key: 'result',
      header: t('audit:data.result'),
      cell: ({ resultName, unit }) => (unit ? `${resultName}, ${unit}` : resultName),
    },
    wholeColumn(
      {
        key: 'part',
        header: t('audit:data.part'),
        rows: readings,
        value: ({ part }) => part,
      },
      wording,
    ),
    figureColumn(
      {
        key: 'value',
        header: t('audit:data.value'),
        rows: readings,
        value: ({ value, rejects }) => rejects ?? value,
        write: figures.one,
      },
      wording,
    ),
    ...(hasLots
      ? [
          wholeColumn<AuditReading>(
            {
              key: 'lot',
              header: t('audit:data.lot'),
              rows: readings,
              value: ({ lot }) => lot,
            },
            wording,
          ),
        ]
      : []),
    {
      key: 'state',
      header: t('audit:data.state'),
      cell: ({ state }) => t(`audit:data.readingStates.${state}`),
    },
    {
      key: 'source',
      header: t('audit:data.source'),
      cell: ({ source }) => t(`audit:data.sources.${source}`),
    },
    {
      key: 'when',
      header: t('audit:data.when'),
      cell: ({ createdAt }) => (
        <time className="figures whitespace-nowrap" dateTime={new Date(createdAt).toISOString()}>
          {formats.dateTime(createdAt)}
        </time>
      ),
    },
    ...(showsNames
      ? [
          {
            key: 'who',
            header: t('audit:data.enteredBy'),
            cell: ({ enteredByName }: AuditReading) => enteredByName ?? '\u2013',
          },
        ]
      : []),
    { key: 'reason', header: t('audit:data.reason'), cell: ({ reason }) => reason ?? '' },
  ];
  return (
    <FigureTable
      id="readings-table"
      caption={t('audit:data.readings')}
      columns={columns}
      rows={readings}
      rowKey={({ id }) => id}
      empty={t('audit:data.noReadings')}
      {...wording}
    />
  );
}
