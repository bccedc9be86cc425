import type { Fact } from '../facts.ts';
import { type CoachDraft, completeDraft, readNumber, readPositive } from './draft.ts';
import { PlanError } from './plan-error.ts';
import { assumedSetupShare } from './planning-scale.ts';
import type { Proposal } from './proposal.ts';
import { listBestPlans } from './propose-plans.ts';
import { warnOfThinLot } from './thin-lots.ts';

const nearlyAtFloor = 1.1;

/** What is odd about the results: lots too thin to count in, parts that cannot help, a gain too small to be seen. */
export function coachResults(draft: CoachDraft): Fact[] {
  const results = [draft.response, ...(draft.watch ?? [])];
  const lots = results.flatMap((response, result) => {
    const kind = response?.kind ?? 'measured';
    const [lotSize, usualRate] = [readPositive(response?.lotSize), readNumber(response?.usualRate)];
    if (kind === 'rejects' && lotSize === undefined) return [];
    return warnOfThinLot(
      { kind, ...(lotSize && { lotSize }), ...(usualRate !== undefined && { usualRate }) },
      result,
    );
  });
  return [...lots, ...coachParts(draft), ...coachWorth(draft)];
}

/** Variance of a run's mean: setup² + sd²/parts. */
function coachParts({ response, noise }: CoachDraft): Fact[] {
  const parts = readPositive(response?.partsPerRun);
  const sd = readPositive(noise?.sd);
  const given = readNumber(noise?.setup);
  if ((response?.kind ?? 'measured') !== 'measured' || noise?.of !== 'part') return [];
  if (parts === undefined || parts <= 1 || sd === undefined) return [];
  const floor = given ?? assumedSetupShare * sd;
  if (!(floor > 0)) return [];
  const enoughParts = Math.max(1, Math.ceil((sd / floor) ** 2 / (nearlyAtFloor ** 2 - 1)));
  const values = { parts, runSd: Math.hypot(floor, sd / Math.sqrt(parts)), floor, enoughParts };
  return [
    { kind: 'parts-meet-setup', values: { ...values, assumed: given === undefined }, refs: { results: [0] } },
  ];
}

function coachWorth(draft: CoachDraft): Fact[] {
  const worthHaving = readPositive(draft.response?.worthHaving);
  const sharpest = findSharpest(draft);
  if (worthHaving === undefined || sharpest === null || worthHaving >= sharpest.spots) return [];
  return [{ kind: 'worth-having-below-sight', values: { worthHaving, ...sharpest }, refs: { results: [0] } }];
}

/** The smallest change that some plan within the limits would spot, and its runs; null while nothing can be said or nothing fits. */
function findSharpest(draft: CoachDraft): { spots: number; runs: number } | null {
  const seen = plansFor(draft).flatMap(({ detectable, runs }) =>
    detectable.filter(({ unit }) => unit === 'response').map(({ size }) => ({ spots: size, runs })),
  );
  const [first, ...others] = seen;
  if (first === undefined) return null;
  return others.reduce((least, other) => (other.spots < least.spots ? other : least), first);
}

function plansFor(draft: CoachDraft): Proposal[] {
  const brief = completeDraft(draft);
  if (brief === null) return [];
  try {
    return listBestPlans(brief);
  } catch (error) {
    // What no plan fits is said where plans are dealt.
    if (error instanceof PlanError) return [];
    throw error;
  }
}
