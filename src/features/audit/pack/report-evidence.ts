import type { Analysis } from '../../../lib/doe/index.ts';
import type { StoredResult } from './check-tables.ts';
import { sectionHtml, tableHtml } from './html.ts';
import type { PackReader } from './pack-words.ts';

/** Enough digits to follow a figure by hand; all of them stand in the tables of the pack. */
const digits = 5;

export function writeFigure(value: number | null | undefined): string {
  if (value === null || value === undefined) return '';
  return String(Number(value.toPrecision(digits)));
}

function effectsOf(name: string, { intercept, terms, basis }: Analysis, { t }: PackReader): string {
  const level = Math.round((1 - basis.alpha) * 100);
  const head = [
    t('audit-pack:report.term'),
    t('audit-pack:report.effect'),
    t('audit-pack:report.se'),
    t('audit-pack:report.interval', { level }),
    'p',
    t('audit-pack:report.pFamily'),
  ];
  const rows = [intercept, ...terms].map(({ term, effect, se, ci, p, pFamily, aliasedWith }) => [
    [term, ...aliasedWith].join(' = '),
    writeFigure(effect),
    writeFigure(se),
    ci ? ci.map(writeFigure).join(' … ') : '',
    writeFigure(p),
    writeFigure(pFamily),
  ]);
  return sectionHtml(t('audit-pack:report.effects', { name }), tableHtml(head, rows));
}

function varianceOf(name: string, { anova }: Analysis, { t }: PackReader): string {
  const head = [
    t('audit-pack:report.sourceHead'),
    t('audit-pack:report.df'),
    t('audit-pack:report.ss'),
    t('audit-pack:report.ms'),
    'F',
    'p',
  ];
  const rows = anova.map(({ source, df, ss, ms, f, p }) => [
    t(`audit-pack:report.source.${source}`),
    ...[df, ss, ms, f, p].map(writeFigure),
  ]);
  return sectionHtml(t('audit-pack:report.anova', { name }), tableHtml(head, rows));
}

/** Effects and analysis of variance of each result, as they were stored with the verdict. */
export function evidenceHtml(results: readonly StoredResult[], reader: PackReader): string {
  return results
    .flatMap(({ spec, analysis }) => [
      effectsOf(spec.name, analysis, reader),
      varianceOf(spec.name, analysis, reader),
    ])
    .join('\n');
}
