import type { Proposal } from './proposal.ts';

/** What one plan can have over another; smaller is better in each. */
function measure(proposal: Proposal): number[] {
  const size = (effect: 'easy' | 'hardToChange') =>
    proposal.detectable.find((detectable) => detectable.effect === effect)?.size ?? Number.POSITIVE_INFINITY;
  const tied = proposal.aliases.filter(
    (alias) => alias.term.length <= 2 && alias.with.some((other) => other.term.length <= 2),
  );
  const hidden = proposal.confoundedWithBlocks.filter((term) => term.length <= 2);
  // Freely shuffled, hard settings are seen as well as easy ones.
  const hardSize = proposal.wholePlots === undefined ? size('easy') : size('hardToChange');
  return [
    proposal.runs,
    proposal.minutes ?? 0,
    proposal.cost ?? 0,
    Math.max(size('easy'), proposal.detectable.length === 0 ? Number.POSITIVE_INFINITY : 0),
    hardSize,
    tied.length,
    hidden.length,
    proposal.centerPoints > 0 ? 0 : 1,
    mainEffectsApart(proposal) ? 0 : 1,
  ];
}

/** Plans that no other plan beats or equals in everything, in the order given. */
export function keepUndominated(proposals: readonly Proposal[]): Proposal[] {
  const measured = proposals.map((proposal) => ({ proposal, measures: measure(proposal) }));
  return measured
    .filter(
      ({ measures }, index) =>
        !measured.some((other, place) => {
          if (place === index || !other.measures.every((value, which) => value <= (measures[which] ?? 0)))
            return false;
          const same = other.measures.every((value, which) => value === measures[which]);
          return !same || place < index;
        }),
    )
    .map(({ proposal }) => proposal);
}

/** No main effect shares its estimate with a pair that could be asked about. */
export function mainEffectsApart(proposal: Proposal): boolean {
  return proposal.resolution >= 4;
}

/** The price of a plan: money where it is known, else time, else runs. */
export function priceOf({ cost, minutes, runs }: Proposal): number {
  return cost ?? minutes ?? runs;
}
