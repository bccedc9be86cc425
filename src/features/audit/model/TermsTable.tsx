import type { TableColumn } from '../../../components/ui/Table.tsx';
import { listTermVariances, type TermEstimate } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';
import { nameTerm } from './name-term.ts';

interface Props extends AuditWording {
  readonly model: AuditModelView;
}

/** Every term with its estimate, its error, both tests and its share of the variance. */
export function TermsTable({ model, ...wording }: Props) {
  const { t, figures } = wording;
  const { analysis, factors } = model;
  const variances = new Map(listTermVariances(analysis).map((row) => [row.term, row]));
  const rows = [analysis.intercept, ...analysis.terms];
  const isMean = ({ term }: TermEstimate) => term === analysis.intercept.term;
  const figure = (
    key: string,
    header: string,
    value: (row: TermEstimate) => number | null,
    write?: (value: number) => string,
  ) => figureColumn({ key, header, rows, value, write }, wording);
  const spans = analysis.terms.flatMap(({ ci, effect }) => [effect, ...(ci ?? [])]);
  const wide = figures.column(spans);
  const columns: TableColumn<TermEstimate>[] = [
    {
      key: 'term',
      header: t('audit-model:terms.term'),
      rowHeader: true,
      cell: (row) => (
        <span id={isMean(row) ? 'term-mean' : `term-${row.term}`}>
          {isMean(row) ? t('audit-model:terms.intercept') : row.term}
        </span>
      ),
    },
    {
      key: 'names',
      header: t('audit-model:terms.names'),
      cell: (row) => (
        <span className="whitespace-nowrap">{isMean(row) ? '' : nameTerm(row.term, factors)}</span>
      ),
    },
    figure('effect', t('audit-model:terms.effect'), (row) => (isMean(row) ? null : row.effect), wide),
    figure('coefficient', t('audit-model:terms.coefficient'), ({ coefficient }) => coefficient),
    figure('se', t('audit-model:terms.se'), ({ se }) => se),
    figure('from', t('audit-model:terms.from'), (row) => (isMean(row) ? null : (row.ci?.[0] ?? null)), wide),
    figure('to', t('audit-model:terms.to'), (row) => (isMean(row) ? null : (row.ci?.[1] ?? null)), wide),
    figure('t', t('audit-model:terms.t'), (row) => row.t),
    figure('df', t('audit-model:terms.df'), ({ df }) => df, figures.tick),
    figure('p', t('audit-model:terms.p'), ({ p }) => p, figures.p),
    figure('pFamily', t('audit-model:terms.pFamily'), ({ pFamily }) => pFamily, figures.p),
    figure('ss', t('audit-model:terms.ss'), (row) => (isMean(row) ? null : row.ss)),
    figure('f', t('audit-model:terms.f'), ({ term }) => variances.get(term)?.f ?? null),
    ...(analysis.error.strata
      ? [
          {
            key: 'stratum',
            header: t('audit-model:terms.stratum'),
            cell: ({ stratum }: TermEstimate) => (stratum ? t(`audit-model:stratum.${stratum}`) : ''),
          },
        ]
      : []),
    {
      key: 'aliased',
      header: t('audit-model:terms.aliased'),
      cell: ({ aliasedWith }) => aliasedWith.join(' + '),
    },
  ];
  return (
    <FigureTable
      id="terms-table"
      caption={t('audit-model:terms.title')}
      columns={columns}
      rows={rows}
      rowKey={({ term }) => term}
      {...wording}
    />
  );
}
