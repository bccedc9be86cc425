import type { Fact } from '../facts.ts';
import { mainEffectsApart, priceOf } from './compare-proposals.ts';
import type { PlanningScale } from './planning-scale.ts';
import type { Proposal } from './proposal.ts';

const wantedPower = 0.8;

/** The plan to take, and why. */
export interface Recommendation {
  proposal: Proposal;
  reason: Fact;
}

/**
 * The cheapest plan that finds W 8 times in 10 with main effects apart from pairs; if there is none, the most power of those. Plans with tied main
 * effects only as a first look; plans that leave a hard setting unjudged only where no other fits.
 *
 * @throws RangeError when there is nothing to choose from.
 */
export function recommend(proposals: readonly Proposal[]): Recommendation {
  const apart = proposals.filter(mainEffectsApart);
  const judging = apart.filter(judgesAll);
  if (judging.length > 0) return chooseByPower(judging);
  if (apart.length > 0) return giveReason(best(apart, byPowerThenPrice), 'fits-the-limits');
  return giveReason(best(proposals, byPowerThenPrice), 'screen-first');
}

/** Noise below a quarter of W: then one setting at a time does as well as a screening plan. */
export function isNoiseTiny({ runSd, worthHaving }: PlanningScale): boolean {
  return worthHaving !== null && runSd < worthHaving / 4;
}

function chooseByPower(proposals: readonly Proposal[]): Recommendation {
  const strong = proposals.filter(({ powerAtWorthHaving: power }) => power !== null && power >= wantedPower);
  if (strong.length > 0) return giveReason(best(strong, byPriceThenPower), 'cheapest-with-power');
  if (proposals.some(({ powerAtWorthHaving }) => powerAtWorthHaving !== null))
    return giveReason(best(proposals, byPowerThenPrice), 'most-power-within-limits');
  const ownError = proposals.filter(({ errorPlan }) => errorPlan.rung.startsWith('replicates'));
  if (ownError.length > 0) return giveReason(best(ownError, byPriceThenPower), 'cheapest-with-own-error');
  return giveReason(best(proposals, byPriceThenPower), 'fits-the-limits');
}

function judgesAll(proposal: Proposal): boolean {
  return !proposal.warnings.some(({ kind }) => kind === 'hard-setting-not-judged');
}

function giveReason(proposal: Proposal, kind: ReasonKind): Recommendation {
  const { runs, resolution, powerAtWorthHaving } = proposal;
  const power = powerAtWorthHaving ?? 0;
  const reason: Fact =
    kind === 'screen-first'
      ? { kind, values: { resolution }, refs: {} }
      : kind === 'fits-the-limits' || kind === 'cheapest-with-own-error'
        ? { kind, values: { runs }, refs: {} }
        : { kind, values: { power, runs }, refs: {} };
  return { proposal, reason };
}

type ReasonKind =
  | 'cheapest-with-power'
  | 'most-power-within-limits'
  | 'cheapest-with-own-error'
  | 'screen-first'
  | 'fits-the-limits';

type Compare = (first: Proposal, second: Proposal) => number;

const byPriceThenPower: Compare = (first, second) =>
  priceOf(first) - priceOf(second) ||
  first.runs - second.runs ||
  Math.min(second.resolution, 5) - Math.min(first.resolution, 5) ||
  powerOf(second) - powerOf(first);

const byPowerThenPrice: Compare = (first, second) =>
  powerOf(second) - powerOf(first) || sizeOf(first) - sizeOf(second) || priceOf(first) - priceOf(second);

const powerOf = ({ powerAtWorthHaving }: Proposal) => powerAtWorthHaving ?? -1;

const sizeOf = ({ detectable }: Proposal) =>
  detectable.length === 0 ? Number.MAX_VALUE : Math.max(...detectable.map(({ size }) => size));

function best(proposals: readonly Proposal[], compare: Compare): Proposal {
  const [first] = proposals.toSorted(compare);
  if (first === undefined) throw new RangeError('recommend: proposals must not be empty');
  return first;
}
