import { termColumn } from '../analysis/terms.ts';
import type { Brief } from '../brief.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import type { Candidate } from './candidate.ts';
import { catalogue } from './catalogue.ts';
import { worstEffectVariance } from './effect-variance.ts';
import { isConstantWithin } from './error-plan.ts';
import { type JudgedIn, sizeFamilies } from './family-sizes.ts';
import { groupBy } from './group-by.ts';
import { listWarnings } from './list-warnings.ts';
import type { PlanningScale } from './planning-scale.ts';
import { type HardSettings, promise } from './promises.ts';
import type { Proposal } from './proposal.ts';
import { lettersUpTo } from './words.ts';

/** A candidate with its promises and warnings; not yet compared with others. */
export function describeCandidate(brief: Brief, candidate: Candidate, scale: PlanningScale): Proposal {
  const { structure, rows, centerPoints, errorPlan, minutes, cost } = candidate;
  const { wholePlots } = structure;
  const settingsWhere = (isHard: boolean) =>
    brief.factors.flatMap((factor, index) => ((factor.hardToChange ?? false) === isHard ? [index] : []));
  const grouped = wholePlots !== undefined;
  const easy = grouped ? settingsWhere(false) : brief.factors.map((_, index) => index);
  const promises = promise({
    scale,
    errorPlan: wholePlots?.judged === false ? withoutWholeStratum(errorPlan) : errorPlan,
    familyOf: sizeFamilies(placeEffects(candidate), errorPlan),
    easyVariance: worstEffectVariance(structure, rows, easy),
    ...(grouped ? { hard: describeHard(candidate, settingsWhere(true), wholePlots.count) } : {}),
  });
  return {
    id: nameCandidate(candidate),
    k: structure.k,
    baseRuns: structure.baseRuns,
    replicates: structure.replicates,
    centerPoints,
    blocks: structure.blocks,
    ...(wholePlots === undefined ? {} : { wholePlots: new Set(rows.map((row) => row.wholePlot)).size }),
    runs: rows.length,
    generators: structure.generators,
    definingWords: structure.definingWords,
    resolution: structure.resolution,
    aliases: structure.aliases,
    confoundedWithBlocks: structure.confoundedWithBlocks,
    errorPlan,
    ...promises,
    ...(minutes === undefined ? {} : { minutes }),
    ...(cost === undefined ? {} : { cost }),
    recommended: false,
    reasons: [],
    warnings: listWarnings({ brief, candidate, scale }),
    terms: structure.terms,
    ...(structure.irregular === undefined ? {} : { efficiencies: structure.irregular.efficiencies }),
    layout: rows,
  };
}

/** The stratum in which each tested term, and the bend, will be judged. */
function placeEffects({ structure, rows }: Candidate): JudgedIn[] {
  const letters = lettersUpTo(structure.k);
  const bend = rows.some((row) => row.center) ? [rows.map((row) => (row.center ? 1 : 0))] : [];
  const columns = [...structure.terms.map((term) => termColumn(term, letters, rows)), ...bend];
  if (structure.wholePlots === undefined) return columns.map(() => undefined);
  const plots = indicatorColumns(rows.map((row) => row.wholePlot));
  return columns.map((column) => (isConstantWithin(plots, column) ? 'whole' : 'sub'));
}

function describeHard(
  { structure, rows }: Candidate,
  settings: readonly number[],
  plots: number,
): HardSettings {
  const variance = worstEffectVariance(structure, rows, settings) ?? 0;
  const all = groupBy(rows, (row) => row.wholePlot);
  const middles = all.filter((plot) => plot.every((row) => row.center));
  const different = new Set(middles.map((plot) => plot.map((row) => row.x.join(' ')).join('; ')));
  const middleRuns = middles.reduce((sum, plot) => sum + plot.length, 0);
  return {
    plots,
    runsEach: (rows.length - middleRuns) / (all.length - middles.length),
    middleDf: Math.max(0, middles.length - different.size),
    middleRunsEach: middleRuns / Math.max(1, middles.length),
    inflation: (variance * structure.corners.length) / 4,
  };
}

/** Fewer than two whole plots a level: declared unjudged before the start, even where middle plots would give it some error. */
function withoutWholeStratum(errorPlan: Candidate['errorPlan']): Candidate['errorPlan'] {
  const strata = errorPlan.strata?.filter(({ name }) => name === 'sub');
  return strata === undefined ? errorPlan : { ...errorPlan, strata };
}

/** The same for the same structure, whatever the brief's numbers. */
function nameCandidate({ structure, centerPoints }: Candidate): string {
  const { k, baseRuns, replicates, blocks, generators, irregular, terms } = structure;
  const parts = [`k${k}`, `n${baseRuns}`, `r${replicates}`, `c${centerPoints}`, `b${blocks}`];
  if (structure.wholePlots) parts.push(`w${structure.wholePlots.count}`);
  if (!isListed(generators, k)) parts.push(generators.join('.'));
  if (irregular) parts.push(`t${terms.length}`);
  return parts.join('-');
}

/** Whether a plan stands in the catalogue as it is, without a turned sign or exchanged letters. */
function isListed(generators: readonly string[], k: number): boolean {
  const written = generators.join('.');
  return catalogue.some((entry) => entry.k === k && entry.generators.join('.') === written);
}
