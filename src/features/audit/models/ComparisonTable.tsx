import type { TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditWording } from '../audit-wording.ts';
import { auditAddress } from '../frame/audit-parts.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';
import type { ComparedModel, ModelsView } from './compared-model.ts';

interface Props extends AuditWording {
  readonly view: ModelsView;
  readonly trialId: string;
}

/** How well each model fits, the trial's own first. */
export function ComparisonTable({ view, trialId, ...wording }: Props) {
  const { t, figures } = wording;
  const rows = view.models;
  const figure = (
    key: string,
    header: string,
    value: (row: NonNullable<ComparedModel['analysis']>) => number | null,
    write?: (value: number) => string,
  ) =>
    figureColumn<ComparedModel>(
      { key, header, rows, value: ({ analysis }) => (analysis ? value(analysis) : null), write },
      wording,
    );
  const changes = ({ spec, added, analysis, isStale }: ComparedModel): string => {
    if (!spec) return t('audit-models:own');
    const { transform, without, stretchesAsBlocks, error } = spec;
    return [
      analysis ? '' : t('audit-models:broken'),
      isStale ? t('audit-models:stale') : '',
      transform.kind === 'none' ? '' : t(`audit-models:transform.${transform.kind}`),
      transform.kind === 'boxCox' ? `\u03bb = ${figures.tick(transform.lambda)}` : '',
      ...without.map(({ run, reason }) => t('audit-models:leftOut', { run, reason })),
      stretchesAsBlocks ? t('audit-models:stretches') : '',
      t(`audit-models:error.${error}`),
      added.length > 0 ? t('audit-models:added', { terms: added.join(', ') }) : '',
    ]
      .filter((part) => part !== '')
      .join('; ');
  };
  const columns: TableColumn<ComparedModel>[] = [
    {
      key: 'name',
      header: t('audit-models:model'),
      rowHeader: true,
      cell: ({ id, name, spec }) => (
        <a
          href={auditAddress(trialId, 'model', {
            ...(spec?.result
              ? { result: spec.result }
              : id === null && view.result
                ? { result: view.result }
                : {}),
            ...(id === null ? {} : { model: id }),
          })}
        >
          {id === null ? t('audit-models:ownName') : name}
        </a>
      ),
    },
    { key: 'changes', header: t('audit-models:changes'), cell: changes },
    figure('n', t('audit-model:fit.n'), ({ n }) => n, figures.tick),
    figure('terms', t('audit-models:terms'), ({ terms }) => terms.length, figures.tick),
    figure('sd', 's', ({ error }) => error.sd, figures.one),
    figure('df', t('audit-model:terms.df'), ({ error }) => error.df, figures.tick),
    figure('r2', 'R\u00b2', ({ r2 }) => r2),
    figure('adjusted', t('audit-model:fit.adjusted'), ({ r2Adjusted }) => r2Adjusted),
    figure('predicted', t('audit-model:fit.predicted'), ({ r2Predicted }) => r2Predicted),
    figure('lackOfFit', t('audit-models:lackOfFit'), ({ lackOfFit }) => lackOfFit?.p ?? null, figures.p),
  ];
  return (
    <FigureTable
      id="models-table"
      caption={t('audit-models:compared')}
      columns={columns}
      rows={rows}
      rowKey={({ id }) => id ?? 'own'}
      {...wording}
    />
  );
}
