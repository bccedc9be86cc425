import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditPlanView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly plan: AuditPlanView;
}

type Factor = AuditPlanView['brief']['factors'][number];

/** The factors with their levels, by letter. */
export function FactorTable({ plan, ...wording }: Props) {
  const { t, figures } = wording;
  const rows = plan.brief.factors.map((factor, place) => ({ factor, ...plan.factors[place] }));
  type Row = (typeof rows)[number];
  const level = (factor: Factor, end: 'low' | 'high' | 'usual') => {
    const value = factor[end];
    if (typeof value === 'number') return <data value={String(value)}>{figures.one(value)}</data>;
    return end === 'usual' && factor.kind === 'choice' ? factor[factor.usual] : value;
  };
  const columns: TableColumn<Row>[] = [
    { key: 'letter', header: t('audit:plan.letter'), cell: ({ letter }) => letter, rowHeader: true },
    { key: 'name', header: t('audit:plan.factor'), cell: ({ name }) => name },
    { key: 'unit', header: t('audit:plan.unit'), cell: ({ unit }) => unit },
    { key: 'low', header: t('audit:plan.low'), cell: ({ factor }) => level(factor, 'low'), figures: true },
    { key: 'high', header: t('audit:plan.high'), cell: ({ factor }) => level(factor, 'high'), figures: true },
    {
      key: 'usual',
      header: t('audit:plan.usual'),
      cell: ({ factor }) => level(factor, 'usual'),
      figures: true,
    },
    {
      key: 'change',
      header: t('audit:plan.change'),
      cell: ({ factor }) => t(factor.hardToChange ? 'audit:plan.hard' : 'audit:plan.easy'),
    },
  ];
  return (
    <FigureTable
      id="factors"
      caption={t('audit:plan.factors')}
      columns={columns}
      rows={rows}
      rowKey={({ letter }) => letter ?? ''}
      {...wording}
    />
  );
}
