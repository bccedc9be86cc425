import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import { findTrial } from '../trial/trial.repository.ts';
import type { PublicTrial } from '../trial/trial.schema.ts';
import { addDraft } from '../trial/trial.service.ts';
import { findTrialOf, readPublicTrial, type TrialReader } from '../trial/trial-reader.service.ts';
import { findLatestVerdict } from './decide.service.ts';
import { listDecisions } from './decision.repository.ts';
import { isAdopted } from './decision.ts';
import { followReasonsOf } from './follow-reason.ts';
import { nextAnswers } from './next-answers.ts';
import { keepFollow } from './next-trial.repository.ts';
import type { NextTrialWish } from './next-trial.schema.ts';

/**
 * Begins the trial that follows, its answers filled in from what was learnt. The same id again adds nothing.
 * @throws AppError `not-found`; `not-now` where the verdict does not speak of such a trial, or an engineer must look first
 */
export function beginNextTrial(
  scope: ShopScope,
  wish: NextTrialWish & { trialId: string },
  reader: TrialReader,
): Promise<PublicTrial> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, wish.trialId);
    if (await findTrial(inner, wish.id)) return readPublicTrial(inner, wish.id);
    const { facts } = await findLatestVerdict(inner, trial.id);
    const plan = await findLatestPlan(inner, trial.id, 'main');
    const isOpen = trial.state === 'deciding' || trial.state === 'closed';
    if (!plan || !isOpen || !followReasonsOf(facts).includes(wish.reason))
      throw new AppError('not-now', { detail: `no next trial by ${wish.reason}` });
    const { answers } = await readStoredAnswers(inner, trial.id);
    const followed = {
      answers,
      brief: plan.brief,
      settingIds: plan.settingIds,
      bet: facts.bet,
      verdict: facts.verdict,
      runs: plan.proposal.runs,
      adopted: trial.state === 'closed' && isAdopted(await listDecisions(inner, trial.id)),
    };
    await addDraft(
      inner,
      { id: wish.id, answers: nextAnswers(followed, wish.reason), copyOf: trial.id },
      reader,
    );
    await keepFollow(inner, { id: wish.id, follows: trial.id, reason: wish.reason });
    await recordActivity(inner, {
      kind: 'trial.followed',
      subjectId: trial.id,
      trialId: trial.id,
      details: { by: wish.id, reason: wish.reason },
    });
    return readPublicTrial(inner, wish.id);
  });
}
