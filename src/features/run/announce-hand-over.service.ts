import type { ShopScope } from '../../server/db/scope.ts';
import type { Trial } from '../trial/trial.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import type { Run } from './run.ts';

/**
 * What handing a run over sends out, in the transaction at hand: a prompt to the one before that has not gone out yet is
 * cancelled. The next one is asked when the run's turn comes.
 * @param about.before who had it; null: nobody yet
 */
export async function announceHandOver(
  scope: ShopScope,
  about: { trial: Trial; run: Run; before: string | null; after: string },
): Promise<void> {
  await cancelUnsentPrompts(scope, { trialId: about.trial.id, runId: about.run.id });
}
