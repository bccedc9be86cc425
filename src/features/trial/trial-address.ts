import type { TrialState } from './trial-states.ts';

/** The page on which a trial in this state goes on. */
const pageOf = {
  draft: 'problem',
  'plan review': 'review',
  ready: 'start',
  running: 'board',
  paused: 'board',
  held: 'board',
  'readings in': 'board',
  'verdict review': 'verdict',
  deciding: 'verdict',
  'adoption review': 'verdict',
  closed: 'verdict',
} as const satisfies Record<TrialState, string>;

export function trialAddress({ id, state }: { id: string; state: TrialState }): string {
  return `/trials/${id}/${pageOf[state]}`;
}
