import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from '../trial/trial.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import type { Run } from './run.ts';

/** How a trial came to its end: every run is closed, or somebody ended it early. */
export type TrialEnd = 'all in' | 'early';

/**
 * What the end of the making sends out, in the transaction at hand: whatever still asks for a run is cancelled.
 */
export async function announceEnd(
  scope: ShopScope,
  about: { trial: Trial; runs: readonly Run[]; how: TrialEnd },
): Promise<void> {
  await cancelUnsentPrompts(scope, { trialId: about.trial.id });
}
