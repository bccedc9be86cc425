import type { Fact, Proposal } from '../../../../lib/doe/index.ts';

/** What a card is headed by. */
export type CardTitle = 'recommended' | 'quicker' | 'surer' | 'middle' | 'other';

/** @param recommended the plan that the others are compared with */
export function titleOf(proposal: Proposal, recommended: Proposal | undefined): CardTitle {
  if (proposal.recommended) return 'recommended';
  const kinds = proposal.reasons.map(({ kind }) => kind);
  if (kinds.includes('surer')) return 'surer';
  if (kinds.includes('quicker')) return 'quicker';
  const isAlone = proposal.centerPoints > 0 && recommended?.centerPoints === 0;
  return isAlone ? 'middle' : 'other';
}

/** Reasons that say why it is recommended, rather than what the plan can do. */
const recommending = new Set<Fact['kind']>([
  'cheapest-with-power',
  'most-power-within-limits',
  'cheapest-with-own-error',
  'screen-first',
  'fits-the-limits',
]);

export function isRecommending({ kind }: Fact): boolean {
  return recommending.has(kind);
}

/** What must be seen without opening anything: strengths, cautions, and whether the middle is looked at. */
const inView = new Set<Fact['kind']>([
  'main-effects-apart',
  'pairs-apart',
  'shows-a-bend',
  'judges-hard-settings',
  'judges-spread',
  'block-too-small',
  'hard-setting-not-judged',
  'hard-settings-shuffled',
  'no-error-estimate',
  'few-rejects',
  'middle-touches-rule',
  'one-at-a-time-would-do',
  'bend-not-shown',
  'pair-emptied-by-rule',
]);
const mostTies = 2;

/** The title says the first two; the ties of single settings have lines of their own. */
const saidElsewhere = new Set<Fact['kind']>(['quicker', 'surer', 'main-effects-tied-to-pairs']);

/** The facts of a card, split into those in view and those that open. */
export function splitFacts({ reasons, warnings }: Proposal): { shown: Fact[]; folded: Fact[] } {
  const told = [...reasons, ...warnings].filter(
    (fact) => !isRecommending(fact) && !saidElsewhere.has(fact.kind),
  );
  const ties = told.filter(({ kind }) => kind === 'pairs-tied');
  const isShown = (fact: Fact) =>
    inView.has(fact.kind) || (ties.length <= mostTies && fact.kind === 'pairs-tied');
  return { shown: told.filter(isShown), folded: told.filter((fact) => !isShown(fact)) };
}

/** The settings that a plan cannot tell from others working together: each with the letters of what it looks like. */
export function tiedSettings({ aliases }: Proposal): { letter: string; others: string[] }[] {
  return aliases.flatMap(({ term, with: partners }) => {
    const others = partners.map((partner) => partner.term).filter(({ length }) => length === 2);
    return term.length === 1 && others.length > 0 ? [{ letter: term, others }] : [];
  });
}

/** How often in ten a gain of the size one cares about would be found; null where nobody can say. */
export function timesInTen({ powerAtWorthHaving: power }: Proposal): number | null {
  return power === null ? null : Math.min(9, Math.max(0, Math.round(power * 10)));
}
