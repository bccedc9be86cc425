import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditDataView, AuditRun } from '../audit-data-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, wholeColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly data: AuditDataView;
}

/** What each run was to be set to and what the dials were really set to. */
export function SettingsTable({ data, ...wording }: Props) {
  const { t, figures } = wording;
  const { factors, runs } = data;
  const setting = (value: number | string | undefined) =>
    typeof value === 'number' ? <data value={String(value)}>{figures.one(value)}</data> : value;
  const whole = (key: string, header: string, value: (run: AuditRun) => number | null) =>
    wholeColumn({ key, header, rows: runs, value }, wording);
  const columns: TableColumn<AuditRun>[] = [
    {
      key: 'run',
      header: t('audit:data.run'),
      rowHeader: true,
      cell: ({ number }) => (
        <data id={`run-${number}`} value={String(number)}>
          {number}
        </data>
      ),
    },
    { key: 'phase', header: t('audit:data.phase'), cell: ({ phase }) => t(`audit:data.phases.${phase}`) },
    whole('block', t('audit:plan.block'), ({ block }) => block),
    whole('stretch', t('audit:data.stretch'), ({ stretch }) => stretch),
    ...factors.flatMap(({ letter, name, unit }, place): TableColumn<AuditRun>[] => [
      {
        key: `planned-${letter}`,
        header: t('audit:data.planned', { name: unit ? `${name}, ${unit}` : name }),
        figures: true,
        cell: ({ planned }) => setting(planned[place]),
      },
      {
        key: `reached-${letter}`,
        header: t('audit:data.reached', { name }),
        figures: true,
        cell: ({ planned, actual, end }) => {
          const reached = actual?.[place] ?? planned[place];
          if (end === null || end === 'notRun') return '\u2013';
          return reached === planned[place] ? setting(reached) : <strong>{setting(reached)}</strong>;
        },
      },
    ]),
    {
      key: 'end',
      header: t('audit:data.end'),
      cell: ({ end, state, warmUp }) =>
        [
          end ? t(`audit:data.ends.${end}`) : t(`audit:data.states.${state}`),
          warmUp ? t('audit:data.warmUp') : '',
        ]
          .filter((part) => part !== '')
          .join(', '),
    },
  ];
  return (
    <FigureTable
      id="settings-table"
      caption={t('audit:data.settings')}
      columns={columns}
      rows={runs}
      rowKey={({ id }) => id}
      {...wording}
    />
  );
}
