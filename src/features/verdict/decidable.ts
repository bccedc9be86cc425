import type { VerdictView } from './verdict-view.ts';

/** What this reader may do about a verdict. */
export interface Decidable {
  mayDecide: boolean;
  /** How many check runs of each kind are the next step; null: none, or not for this reader. */
  checkPairs: number | null;
  /** Why nothing can be decided here, if that needs a word. */
  why: 'wait' | 'closed' | null;
}

/** Only the newest verdict can be acted on, and check runs are offered until some are in, then as many more as would tell. */
export function decidable(view: VerdictView): Decidable {
  const mayDecide = view.mayDecide && view.isLatest && !view.reviewDue;
  const [check] = view.verdict.next.flatMap((fact) => (fact.kind === 'check-runs' ? [fact.values.each] : []));
  const { confirmation } = view;
  const wanted = confirmation === null ? check : confirmation.furtherPairs;
  const why = view.reviewDue ? 'wait' : view.state === 'closed' ? 'closed' : null;
  return {
    mayDecide,
    checkPairs: mayDecide && wanted !== undefined && wanted > 0 ? Math.min(12, wanted) : null,
    why,
  };
}
