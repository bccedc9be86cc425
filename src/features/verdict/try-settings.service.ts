import type { ResultInput } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { hashInput } from './judge-trial.service.ts';
import { readTrialToJudge } from './make-verdict.service.ts';
import { findVerdict } from './verdict.repository.ts';
import { toResultInputs } from './verdict-input.ts';

/**
 * The readings behind the latest verdict with their analysis, for whoever tries other settings.
 * @returns null where a reading has changed since: what is tried must agree with what the page says
 */
export async function readTryable(scope: ShopScope, trialId: string): Promise<ResultInput[] | null> {
  const verdict = await findVerdict(scope, trialId);
  const input = await readTrialToJudge(scope, trialId);
  if (!verdict || !input || hashInput(input) !== verdict.inputHash) return null;
  return toResultInputs(input.brief, input.proposal, input.runs);
}
