import type { Formats } from '../../../i18n/format.ts';
import type { Translate } from '../../../i18n/translator.ts';
import type { AdviceFact, Fact } from '../../../lib/doe/index.ts';
import { isAdviceFact } from '../../../lib/doe/index.ts';
import type { VerdictView } from '../verdict-view.ts';

/** What every part of the page gets. */
export interface PageWording {
  view: VerdictView;
  t: Translate;
  formats: Formats;
}

/** The facts of these kinds, in their order. */
export function factsOf<Kind extends AdviceFact['kind']>(
  facts: readonly Fact[],
  ...kinds: Kind[]
): Extract<AdviceFact, { kind: Kind }>[] {
  const asked: readonly string[] = kinds;
  return facts.filter(
    (fact): fact is Extract<AdviceFact, { kind: Kind }> => isAdviceFact(fact) && asked.includes(fact.kind),
  );
}

/** Whether the advice is to leave the machine as it is: from the start, or because check runs fell short. */
export function keepsToday({ bet, confirmation }: Pick<VerdictView, 'bet' | 'confirmation'>): boolean {
  return bet.keepToday || confirmation?.outcome === 'fellShort';
}
