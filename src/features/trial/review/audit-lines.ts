import type { TFunction } from 'i18next';
import type { Formats } from '../../../i18n/format.ts';
import type { Alias, Detectable, ErrorPlan, ErrorStratum, Proposal } from '../../../lib/doe/index.ts';

export interface AuditInput {
  t: TFunction<'plan-review'>;
  formats: Formats;
  /** Of the result. */
  unit: string;
  /** The smallest difference worth having, as it was typed. */
  worth: string;
}

export interface AuditLine {
  key: string;
  label: string;
  lines: string[];
}

const roman = ['', 'I', 'II', 'III', 'IV', 'V', 'VI', 'VII', 'VIII'];

function designWords(proposal: Proposal, { t }: AuditInput): string[] {
  const { baseRuns, replicates, centerPoints, blocks, wholePlots } = proposal;
  return [
    t('audit.corners', { count: baseRuns }),
    t('audit.replicates', { count: replicates }),
    ...(centerPoints > 0 ? [t('audit.centers', { count: centerPoints })] : []),
    ...(blocks > 1 ? [t('audit.blocks', { count: blocks })] : []),
    ...(wholePlots === undefined ? [] : [t('audit.wholePlots', { count: wholePlots })]),
  ];
}

/** Coefficients of one are left out, as in any alias list: `A = BCD - E`. */
function aliasWords({ term, with: others }: Alias, { formats }: AuditInput): string {
  const sum = others.map(({ term: other, coefficient }, place) => {
    const sign = coefficient < 0 ? '\u2212 ' : place > 0 ? '+ ' : '';
    const size = Math.abs(coefficient);
    return `${sign}${Math.abs(size - 1) < 1e-9 ? '' : `${formats.number(size)} `}${other}`;
  });
  return `${term} = ${sum.join(' ')}`;
}

function rungWords({ rung, df, highOrderTerms }: ErrorPlan | ErrorStratum, { t }: AuditInput): string {
  const terms = rung === 'replicates+high-order' ? highOrderTerms.join(', ') : '';
  const parts = [t(`audit.rung.${rung}`), terms, df === null ? '' : t('audit.df', { count: df })];
  return parts.filter((part) => part !== '').join(' \u00b7 ');
}

function errorWords(plan: ErrorPlan, input: AuditInput): string[] {
  if (!plan.strata) return [rungWords(plan, input)];
  return plan.strata.map((stratum) =>
    input.t(`audit.stratum.${stratum.name}`, { error: rungWords(stratum, input) }),
  );
}

function sizeWords(detectable: Detectable, { t, formats, unit }: AuditInput): string {
  const say = (size: number) => {
    const number = formats.number(Number(size.toPrecision(3)));
    return detectable.unit === 'response' ? `${number} ${unit}`.trim() : t('audit.sds', { number });
  };
  const [from, to] = detectable.range;
  const words = {
    size: say(detectable.size),
    clear: say(detectable.clearSize),
    from: say(from),
    to: say(to),
  };
  return t('audit.size', words);
}

/** What a plan is in the field's terms, a line for each matter; lines that do not apply are left out. */
export function auditLines(proposal: Proposal, input: AuditInput): AuditLine[] {
  const { t, formats, worth } = input;
  const { resolution, generators, definingWords, aliases, confoundedWithBlocks, errorPlan } = proposal;
  const isFull = !Number.isFinite(resolution);
  const power = proposal.powerAtWorthHaving;
  const lines: AuditLine[] = [
    { key: 'design', label: t('audit.design'), lines: designWords(proposal, input) },
    {
      key: 'resolution',
      label: t('audit.resolution'),
      lines: [isFull ? t('audit.full') : (roman[resolution] ?? formats.number(resolution))],
    },
    { key: 'generators', label: t('audit.generators'), lines: generators },
    {
      key: 'relation',
      label: t('audit.relation'),
      lines: definingWords.length > 0 ? [['I', ...definingWords].join(' = ')] : [],
    },
    {
      key: 'aliases',
      label: t('audit.aliases'),
      lines: aliases.filter((alias) => alias.with.length > 0).map((alias) => aliasWords(alias, input)),
    },
    { key: 'blocks', label: t('audit.withBlocks'), lines: confoundedWithBlocks },
    { key: 'error', label: t('audit.error'), lines: errorWords(errorPlan, input) },
    ...proposal.detectable.map((detectable) => ({
      key: `detectable/${detectable.effect}`,
      label: t(`audit.detectable.${detectable.effect}`),
      lines: [sizeWords(detectable, input)],
    })),
    {
      key: 'power',
      label: t('audit.power', { worth }),
      lines: [power === null ? t('audit.powerUnknown') : `${formats.number(100 * power, 0)} %`],
    },
  ];
  return lines.filter((line) => line.lines.length > 0);
}
