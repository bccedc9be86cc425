import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';

export interface ModelLine {
  key: string;
  label: string;
  value: string;
  anchor?: string;
}

function span(ends: readonly [number, number] | null, { t, figures }: AuditWording): string {
  if (ends === null) return t('audit-model:none');
  return t('audit-model:span', { from: figures.one(ends[0]), to: figures.one(ends[1]) });
}

const known = (value: number | null | undefined, write: (value: number) => string, none: string) =>
  value === null || value === undefined ? none : write(value);

/** Where the error comes from and how large it is. */
export function errorLines({ analysis }: AuditModelView, { t, figures }: AuditWording): ModelLine[] {
  const { error, errorPlan, within } = analysis;
  const none = t('audit-model:none');
  const high = errorPlan.highOrderTerms.join(', ');
  return [
    {
      key: 'source',
      label: t('audit-model:error.source'),
      value: t(`audit-model:error.sources.${error.source}`),
    },
    ...(high && error.source === 'replicates+high-order'
      ? [{ key: 'high', label: t('audit-model:error.high'), value: high }]
      : []),
    { key: 'sd', label: t('audit-model:error.sd'), value: known(error.sd, figures.one, none) },
    {
      key: 'variance',
      label: t('audit-model:error.df'),
      value: known(error.df, figures.one, none),
    },
    ...(error.pureError
      ? [
          {
            key: 'pure',
            label: t('audit-model:error.pure'),
            value: t('audit-model:error.ssOnDf', {
              ss: figures.one(error.pureError.ss),
              df: figures.tick(error.pureError.df),
            }),
          },
        ]
      : []),
    ...(error.strata ?? []).map(({ name, source, df, sd }) => ({
      key: `stratum-${name}`,
      label: t(`audit-model:stratum.${name}`),
      value: [
        t(`audit-model:error.sources.${source}`),
        `s = ${known(sd, figures.one, none)}`,
        `df = ${known(df, figures.one, none)}`,
      ].join(' \u00b7 '),
    })),
    ...(within
      ? [
          {
            key: 'within',
            label: t('audit-model:error.within'),
            value: `s = ${figures.one(within.sd)} \u00b7 df = ${figures.tick(within.df)}`,
          },
        ]
      : []),
  ];
}

function scaleWords(
  { analysis, transform }: Pick<AuditModelView, 'analysis' | 'transform'>,
  t: AuditWording['t'],
  figures: AuditWording['figures'],
): string {
  if (transform.kind === 'none') return t(`audit-model:fit.scales.${analysis.scale}`);
  const words = t(`audit-models:transform.${transform.kind}`);
  return transform.kind === 'boxCox' ? `${words}, \u03bb = ${figures.tick(transform.lambda)}` : words;
}

/** How well the model describes the readings. */
export function fitLines({ analysis, transform }: AuditModelView, { t, figures }: AuditWording): ModelLine[] {
  const { lackOfFit, r2, r2Adjusted, r2Predicted, press, n, alpha } = {
    ...analysis,
    alpha: analysis.basis.alpha,
  };
  const none = t('audit-model:none');
  return [
    { key: 'n', label: t('audit-model:fit.n'), value: figures.tick(n) },
    {
      key: 'scale',
      label: t('audit-model:fit.scale'),
      value: scaleWords({ analysis, transform }, t, figures),
    },
    { key: 'alpha', label: t('audit-model:fit.alpha'), value: figures.tick(alpha) },
    { key: 'r2', label: 'R\u00b2', value: figures.one(r2) },
    { key: 'r2Adjusted', label: t('audit-model:fit.adjusted'), value: figures.one(r2Adjusted) },
    {
      key: 'r2Predicted',
      label: t('audit-model:fit.predicted'),
      value: known(r2Predicted, figures.one, none),
    },
    { key: 'press', label: 'PRESS', value: known(press, figures.one, none) },
    {
      key: 'lackOfFit',
      anchor: 'lack-of-fit',
      label: t('audit-model:fit.lackOfFit'),
      value: lackOfFit
        ? `F = ${figures.one(lackOfFit.f)} \u00b7 df = ${figures.tick(lackOfFit.df)} \u00b7 p = ${figures.p(lackOfFit.p)}`
        : none,
    },
  ];
}

/** The bend that center points show. */
export function curvatureLines({ analysis }: AuditModelView, wording: AuditWording): ModelLine[] {
  const { t, figures } = wording;
  const { curvature } = analysis;
  if (!curvature) return [];
  const none = t('audit-model:none');
  return [
    { key: 'estimate', label: t('audit-model:curvature.estimate'), value: figures.one(curvature.estimate) },
    { key: 'se', label: t('audit-model:terms.se'), value: known(curvature.se, figures.one, none) },
    { key: 'ci', label: t('audit-model:curvature.interval'), value: span(curvature.ci, wording) },
    { key: 'ss', label: t('audit-model:terms.ss'), value: figures.one(curvature.ss) },
    { key: 't', label: t('audit-model:terms.t'), value: known(curvature.t, figures.one, none) },
    { key: 'p', label: t('audit-model:terms.p'), value: known(curvature.p, figures.p, none) },
    {
      key: 'pFamily',
      label: t('audit-model:terms.pFamily'),
      value: known(curvature.pFamily, figures.p, none),
    },
  ];
}
