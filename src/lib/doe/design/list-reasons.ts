import type { Brief } from '../brief.ts';
import { trigamma } from '../distributions/trigamma.ts';
import type { Fact } from '../facts.ts';
import { mainEffectsApart } from './compare-proposals.ts';
import { judgeByDegrees } from './judging.ts';
import type { PlanningScale } from './planning-scale.ts';
import type { Proposal } from './proposal.ts';
import { isNoiseTiny, type Recommendation } from './recommend.ts';
import { letterAt } from './words.ts';

interface Comparison {
  brief: Brief;
  scale: PlanningScale;
  proposal: Proposal;
  recommendation: Recommendation;
}

const enoughParts = 5;
const noticeablySurer = 0.95;

/** Why a plan is among the proposals, the most telling first, and its warnings with what only the comparison shows. */
export function listReasons(comparison: Comparison): Pick<Proposal, 'reasons' | 'warnings'> {
  const { scale, proposal, recommendation } = comparison;
  const isRecommended = proposal === recommendation.proposal;
  const reasons = [
    ...(isRecommended ? [recommendation.reason] : compareWith(proposal, recommendation.proposal)),
    ...listStrengths(comparison),
  ];
  if (mainEffectsApart(proposal) || !isNoiseTiny(scale) || scale.worthHaving === null)
    return { reasons, warnings: proposal.warnings };
  const wouldDo: Fact = {
    kind: 'one-at-a-time-would-do',
    values: { noise: scale.toResponse(scale.runSd), worthHaving: scale.toResponse(scale.worthHaving) },
    refs: {},
  };
  return { reasons, warnings: [wouldDo, ...proposal.warnings] };
}

function compareWith(proposal: Proposal, recommended: Proposal): Fact[] {
  const facts: Fact[] = [];
  if (proposal.runs < recommended.runs)
    facts.push({ kind: 'quicker', values: { fewerRuns: recommended.runs - proposal.runs }, refs: {} });
  const [size, recommendedSize] = [largestSize(proposal), largestSize(recommended)];
  if (size !== null && recommendedSize !== null && size < noticeablySurer * recommendedSize)
    facts.push({ kind: 'surer', values: { size, recommendedSize }, refs: {} });
  return facts;
}

function listStrengths({ brief, proposal }: Comparison): Fact[] {
  const facts: Fact[] = [];
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [letterAt(index)] : []));
  if (hard.length > 0 && proposal.wholePlots === undefined)
    facts.push({ kind: 'judges-hard-settings', values: {}, refs: { factors: hard } });
  if (proposal.resolution >= 5) facts.push({ kind: 'pairs-apart', values: {}, refs: {} });
  else if (mainEffectsApart(proposal)) facts.push({ kind: 'main-effects-apart', values: {}, refs: {} });
  if (proposal.centerPoints > 0)
    facts.push({ kind: 'shows-a-bend', values: { middles: proposal.centerPoints }, refs: {} });
  return [...facts, ...judgeSpread(brief, proposal)];
}

/** ln s of m parts has variance trigamma((m - 1) / 2) / 4 and is judged like any other result. */
function judgeSpread(brief: Brief, proposal: Proposal): Fact[] {
  const parts = brief.response.partsPerRun ?? 1;
  const { df } = proposal.errorPlan;
  if (
    brief.response.kind !== 'measured' ||
    parts < enoughParts ||
    df === null ||
    proposal.wholePlots !== undefined
  )
    return [];
  const corners = proposal.layout.filter((row) => !row.center).length;
  const standardError = Math.sqrt(trigamma((parts - 1) / 2) / corners);
  const ratio = Math.exp(
    judgeByDegrees(df, { tests: proposal.terms.length + 1, strata: 1 }).likelySize * standardError,
  );
  return [{ kind: 'judges-spread', values: { parts, ratio }, refs: { results: [0] } }];
}

function largestSize({ detectable }: Proposal): number | null {
  return detectable.length === 0 ? null : Math.max(...detectable.map(({ size }) => size));
}
