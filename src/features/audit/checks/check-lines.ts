import { type EffectPlot, estimateDrift, fitBoxCox } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import type { ModelLine } from '../model/model-lines.ts';

/** Lenth's published limits, to set beside those that decide. */
export function lenthLines({ lenth }: EffectPlot, { t, figures }: AuditWording): ModelLine[] {
  if (!lenth) return [];
  return [
    { key: 's0', label: 's\u2080', value: figures.one(lenth.s0) },
    { key: 'pse', label: 'PSE', value: figures.one(lenth.pse) },
    { key: 'd', label: t('audit-model:plot.lenthDf'), value: figures.one(lenth.d) },
    { key: 'me', label: 'ME', value: figures.one(lenth.me) },
    { key: 'sme', label: 'SME', value: figures.one(lenth.sme) },
  ];
}

/** The power of Box and Cox; null where readings of zero or less, or no residual, leave none. */
export function boxCoxLines(model: AuditModelView, { t, figures }: AuditWording): ModelLine[] {
  const found = fitBoxCox(model.input);
  if (!found) return [];
  const [from, to] = found.interval;
  return [
    { key: 'lambda', label: '\u03bb', value: figures.one(found.lambda) },
    {
      key: 'interval',
      label: t('audit-model:boxCox.interval'),
      value: t('audit-model:span', { from: figures.one(from), to: figures.one(to) }),
    },
    { key: 'df', label: t('audit-model:boxCox.df'), value: figures.tick(found.residualDf) },
  ];
}

/** A steady change over the run order. */
export function driftLines(model: AuditModelView, { t, figures }: AuditWording): ModelLine[] {
  const found = estimateDrift(model.input, model.analysis);
  if (!found) return [];
  const [from, to] = found.interval;
  return [
    { key: 'change', label: t('audit-model:drift.change'), value: figures.one(found.change) },
    {
      key: 'interval',
      label: t('audit-model:curvature.interval'),
      value: t('audit-model:span', { from: figures.one(from), to: figures.one(to) }),
    },
  ];
}
