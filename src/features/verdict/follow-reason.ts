import type { VerdictView } from './verdict-view.ts';

/** Why a trial follows another: what the verdict said should come next. */
export const followReasons = [
  'narrow-range',
  'move-window',
  'follow-the-curve',
  'untie',
  'repeat-for-certainty',
] as const;
export type FollowReason = (typeof followReasons)[number];

/** The next trials that a verdict speaks of, in its order. */
export function followReasonsOf({ verdict }: Pick<VerdictView, 'verdict'>): FollowReason[] {
  const kinds: readonly string[] = verdict.next.map(({ kind }) => kind);
  return followReasons
    .filter((reason) => kinds.includes(reason))
    .sort((one, other) => kinds.indexOf(one) - kinds.indexOf(other));
}
