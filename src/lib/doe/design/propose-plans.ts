import type { Brief } from '../brief.ts';
import { checkBrief } from './check-brief.ts';
import { keepUndominated, priceOf } from './compare-proposals.ts';
import { describeCandidate } from './describe-candidate.ts';
import { listFittingCandidates } from './fitting-candidates.ts';
import { listReasons } from './list-reasons.ts';
import { choosePlanningScale } from './planning-scale.ts';
import type { Proposal } from './proposal.ts';
import { recommend } from './recommend.ts';

const mostProposals = 4;
/** A plan whose sizes are at most this many times the smallest is as sure as the surest. */
const nearlyAsSure = 1.1;

/**
 * The one to four plans that fit a brief's limits, none of them beaten by another, the recommended one first.
 *
 * @throws PlanError when the brief makes no sense (the field is named) or nothing fits (the limit to relax is named, with the least it would need).
 */
export function proposePlans(brief: Brief): Proposal[] {
  const undominated = listBestPlans(brief);
  const scale = choosePlanningScale(brief);
  const recommendation = recommend(undominated);
  const chosen = pickFew(undominated, recommendation.proposal);
  return chosen.map((proposal) => ({
    ...proposal,
    recommended: proposal === recommendation.proposal,
    ...listReasons({ brief, scale, proposal, recommendation }),
  }));
}

/**
 * All plans that fit a brief's limits and that no other beats, before a few are picked and compared.
 *
 * @throws PlanError like `proposePlans`.
 */
export function listBestPlans(brief: Brief): Proposal[] {
  checkBrief(brief);
  const scale = choosePlanningScale(brief);
  return keepUndominated(
    listFittingCandidates(brief).map((candidate) => describeCandidate(brief, candidate, scale)),
  );
}

/**
 * The recommended plan; beside it full shuffling where hard settings go unjudged, and the best grouping where it shuffles them; then the cheapest, the
 * surest for its price, and what lies between.
 */
function pickFew(proposals: readonly Proposal[], recommended: Proposal): Proposal[] {
  const byPrice = proposals.toSorted(
    (first, second) => priceOf(first) - priceOf(second) || first.runs - second.runs,
  );
  const shuffled = byPrice.filter(({ wholePlots }) => wholePlots === undefined);
  const grouped = byPrice.filter(({ wholePlots }) => wholePlots !== undefined);
  const judging = grouped.filter((proposal) => !leavesHardUnjudged(proposal));
  const smallest = Math.min(...proposals.map(largestSize));
  const surest = byPrice.filter((proposal) => largestSize(proposal) <= nearlyAsSure * smallest);
  const cheaper = byPrice.filter((proposal) => priceOf(proposal) < priceOf(recommended)).toReversed();
  const order = [
    recommended,
    ...(grouped.some(leavesHardUnjudged) ? shuffled.slice(0, 1) : []),
    ...(judging.length > 0 ? surestOf(judging) : grouped.slice(0, 1)),
    ...byPrice.slice(0, 1),
    ...surest.slice(0, 1),
    ...cheaper,
    ...byPrice,
  ];
  const [first = recommended, ...others] = [...new Set(order)].slice(0, mostProposals);
  return [first, ...others.sort((one, other) => priceOf(one) - priceOf(other))];
}

function surestOf(proposals: readonly Proposal[]): Proposal[] {
  return proposals.toSorted((first, second) => largestSize(first) - largestSize(second)).slice(0, 1);
}

function leavesHardUnjudged({ warnings }: Proposal): boolean {
  return warnings.some(({ kind }) => kind === 'hard-setting-not-judged');
}

function largestSize({ detectable }: Proposal): number {
  return detectable.length === 0 ? Number.MAX_VALUE : Math.max(...detectable.map(({ size }) => size));
}
