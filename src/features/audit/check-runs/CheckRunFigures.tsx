import type { AuditCheckRun, AuditChecksView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { AuditPart } from '../frame/AuditPart.tsx';
import { FigureLines } from '../frame/FigureLines.tsx';
import { FigureSources } from '../sources/FigureSources.tsx';
import { FigureTable, figureColumn, wholeColumn } from '../table/FigureTable.tsx';

interface Props extends AuditWording {
  readonly checks: AuditChecksView;
}

function comparisonLines({ checks, t, figures }: Props) {
  const { comparison, outcome } = checks;
  if (!comparison) return [];
  const none = t('audit-model:none');
  const span = (ends: [number, number] | null) =>
    ends ? t('audit-model:span', { from: figures.one(ends[0]), to: figures.one(ends[1]) }) : none;
  return [
    { key: 'best', label: t('audit-model:gain.atBest'), value: figures.one(comparison.meanAtBest) },
    { key: 'usual', label: t('audit-model:gain.atUsual'), value: figures.one(comparison.meanAtUsual) },
    { key: 'gain', label: t('audit-model:gain.gain'), value: figures.one(comparison.gain) },
    { key: 'interval', label: t('audit-model:curvature.interval'), value: span(comparison.interval) },
    { key: 'predicted', label: t('audit-model:gain.predicted'), value: span(comparison.predicted) },
    {
      key: 'sd',
      label: t('audit-model:gain.sd'),
      value: comparison.sd === null ? none : figures.one(comparison.sd),
    },
    { key: 'df', label: t('audit-model:error.df'), value: figures.tick(comparison.df) },
    ...(outcome
      ? [
          {
            key: 'outcome',
            label: t('audit-model:gain.outcome'),
            value: t(`audit-model:gain.outcomes.${outcome}`),
          },
        ]
      : []),
  ];
}

/** New settings against usual ones, run side by side. */
export function CheckRunFigures(props: Props) {
  const { checks, ...wording } = props;
  const { t, figures } = wording;
  const { runs, factors } = checks;
  const lines = comparisonLines(props);
  return (
    <AuditPart id="gain" title={t('audit-model:gain.title')} note={t('audit-model:gain.note')}>
      {lines.length > 0 ? <FigureLines lines={lines} /> : <p>{t('audit-model:gain.notYet')}</p>}
      <FigureTable
        id="check-runs-table"
        showsCaption
        caption={t('audit-model:gain.runs')}
        columns={[
          wholeColumn(
            { key: 'run', header: t('audit:data.run'), rows: runs, value: ({ number }) => number },
            wording,
          ),
          {
            key: 'kind',
            header: t('audit-model:gain.kind'),
            rowHeader: true,
            cell: ({ isBest }: AuditCheckRun) =>
              t(isBest ? 'audit-model:gain.best' : 'audit-model:gain.usual'),
          },
          ...factors.map(({ letter, name }, place) => ({
            key: letter,
            header: name,
            figures: true,
            cell: ({ settings }: AuditCheckRun) => {
              const value = settings[place];
              return typeof value === 'number' ? (
                <data value={String(value)}>{figures.one(value)}</data>
              ) : (
                value
              );
            },
          })),
          figureColumn(
            { key: 'figure', header: checks.spec.name, rows: runs, value: ({ figure }) => figure },
            wording,
          ),
        ]}
        rows={runs}
        rowKey={({ number }) => String(number)}
        {...wording}
      />
      <FigureSources of={['gain', 'bestBet']} {...wording} />
    </AuditPart>
  );
}
