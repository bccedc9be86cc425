import type { ShopScope } from '../../server/db/scope.ts';
import type { TemplateName } from '../message/templates.ts';

/** Texts that ask somebody to make or measure a run. Answers to what a person texted are not among them. */
const asking: readonly TemplateName[] = ['runPrompt', 'resultsWanted', 'remind'];

/**
 * Cancels what asks for runs and has not gone out yet: of a whole trial, or of one run.
 * @returns how many texts there were
 */
export async function cancelUnsentPrompts(
  scope: ShopScope,
  which: { trialId: string; runId?: string },
): Promise<number> {
  const query = scope
    .db('messages')
    .where({ shop_id: scope.shopId, trial_id: which.trialId, state: 'waiting' })
    .whereIn('template', [...asking]);
  if (which.runId !== undefined) query.where({ run_id: which.runId });
  return query.update({ state: 'cancelled' });
}
