import { type EffectPlot, listRunChecks } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import type { ScatterQuestion } from '../chart/scatter-question.ts';

type Chart = ScatterQuestion & { id: string };

/** Labels that would lie on each other say nothing: only the largest are named. */
const mostNamed = 6;

/** The half-normal plot with Lenth's limits as lines and the limit that decides as a bar at each effect. */
export function effectChart(plot: EffectPlot, { t, figures }: AuditWording): Chart {
  const { effects, lenth } = plot;
  const named = new Set(effects.slice(-mostNamed).map(({ term }) => term));
  return {
    id: 'half-normal-chart',
    title: t('audit-model:plot.title'),
    xLabel: t('audit-model:plot.score'),
    yLabel: t('audit-model:plot.size'),
    fromZero: 'both',
    tick: figures.tick,
    points: effects.map(({ term, size, score, limit }) => ({
      x: score,
      y: size,
      ...(named.has(term) ? { label: term } : {}),
      ...(limit === null ? {} : { bar: limit }),
    })),
    lines: lenth
      ? [
          { axis: 'y' as const, value: lenth.me, label: 'ME' },
          { axis: 'y' as const, value: lenth.sme, label: 'SME' },
        ]
      : [],
  };
}

/** Residuals against all that could explain them. */
export function residualCharts(model: AuditModelView, { t, figures }: AuditWording): Chart[] {
  const rows = listRunChecks(model.input, model.analysis);
  const residual = t('audit-model:checks.residual');
  const against = (
    id: string,
    title: string,
    xLabel: string,
    x: (row: (typeof rows)[number]) => number,
  ): Chart => ({
    id,
    title,
    xLabel,
    yLabel: residual,
    tick: figures.tick,
    points: rows.map((row) => ({ x: x(row), y: row.residual })),
    lines: [{ axis: 'y', value: 0, label: '' }],
  });
  return [
    against(
      'residuals-fitted',
      t('audit-model:checks.againstFitted'),
      t('audit-model:checks.fitted'),
      ({ fitted }) => fitted,
    ),
    against(
      'residuals-order',
      t('audit-model:checks.againstOrder'),
      t('audit:plan.order'),
      ({ order }) => order,
    ),
    against(
      'residuals-normal',
      t('audit-model:checks.againstNormal'),
      t('audit-model:checks.score'),
      ({ score }) => score,
    ),
    ...model.factors.map(({ letter, name }, place) =>
      against(
        `residuals-${letter}`,
        t('audit-model:checks.againstFactor', { name }),
        t('audit-model:checks.coded', { name, letter }),
        ({ x }) => x[place] ?? 0,
      ),
    ),
  ];
}
