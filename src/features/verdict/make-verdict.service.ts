import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { newId } from '../../server/ids.ts';
import { queueMessage } from '../message/message.service.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { namesHazard } from '../trial/missing-answers.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import { openReview } from '../trial/review.service.ts';
import { findTrial, updateTrial } from '../trial/trial.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { askSignOff, engineersBeside, wasSentBack } from './ask-sign-off.service.ts';
import { type Judgement, judgeTrial, type TrialToJudge } from './judge-trial.service.ts';
import { findVerdict, findVerdictOfInput, insertVerdict } from './verdict.repository.ts';
import { listVerdictRuns } from './verdict-runs.repository.ts';

/** What the verdict of a trial rests on; null before it was started. */
export async function readTrialToJudge(scope: ShopScope, trialId: string): Promise<TrialToJudge | null> {
  const plan = await findLatestPlan(scope, trialId, 'main');
  if (!plan) return null;
  return {
    brief: plan.brief,
    proposal: plan.proposal,
    runs: await listVerdictRuns(scope, trialId, 'main'),
    checkRuns: await listVerdictRuns(scope, trialId, 'check'),
  };
}

/** Whether an engineer must agree before anybody acts on the verdict. */
async function isReviewDue(scope: ShopScope, trialId: string): Promise<boolean> {
  const { verdictReview } = await findShop(scope);
  if (verdictReview !== 'hazard') return verdictReview === 'always';
  return namesHazard((await readStoredAnswers(scope, trialId)).answers);
}

/**
 * Makes the verdict of a trial whose readings are in: works it out, keeps it as the next one, moves the trial on and
 * tells its owner. The same readings never make a second verdict.
 * @returns whether the trial was moved on; false where nothing was measured, or somebody was faster
 */
export async function makeVerdict(scope: ShopScope, trialId: string): Promise<boolean> {
  const trial = await findTrial(scope, trialId);
  if (trial?.state !== 'readings in') return false;
  const input = await readTrialToJudge(scope, trialId);
  const judgement = input && judgeTrial(input);
  if (!judgement) return false;
  return inTransaction(scope, (inner) => keepVerdict(inner, trial, judgement));
}

async function keepVerdict(scope: ShopScope, trial: Trial, judgement: Judgement): Promise<boolean> {
  // What an engineer sent back waits for another reading, or for somebody to ask again.
  if (await wasSentBack(scope, trial.id, judgement.inputHash)) return false;
  const due = await isReviewDue(scope, trial.id);
  const engineers = due ? await engineersBeside(scope, trial.ownerId) : [];
  const moved = await updateTrial(
    scope,
    { id: trial.id, from: ['readings in'], revision: trial.revision },
    { state: engineers.length > 0 ? 'verdict review' : 'deciding' },
  );
  if (!moved) return false;
  const { inputHash, coreVersion, facts, results } = judgement;
  const known = await findVerdictOfInput(scope, { trialId: trial.id, inputHash, coreVersion });
  const n = known?.n ?? ((await findVerdict(scope, trial.id))?.n ?? 0) + 1;
  if (!known) {
    await insertVerdict(scope, {
      id: newId(),
      trialId: trial.id,
      n,
      inputHash,
      coreVersion,
      facts,
      analysis: results,
    });
  }
  await recordActivity(scope, {
    kind: 'verdict.made',
    subjectId: trial.id,
    trialId: trial.id,
    details: { n, inputHash, coreVersion },
  });
  if (engineers.length > 0) {
    const asked = { hash: inputHash, askedBy: trial.ownerId, engineers };
    await askSignOff(scope, { trial, what: 'verdict', ...asked });
  } else if (due) {
    // Nobody else could look: that stands on record, and the trial does not hang.
    await openReview(scope, {
      trial_id: trial.id,
      subject: 'verdict',
      subject_hash: inputHash,
      state: 'unchecked',
      personId: trial.ownerId,
    });
  }
  await tellOwner(scope, trial, n);
  return true;
}

async function tellOwner(scope: ShopScope, trial: Trial, n: number): Promise<void> {
  await queueMessage(scope, {
    personId: trial.ownerId,
    template: 'verdictReady',
    params: { trial: trial.title, link: `${config().appUrl}/trials/${trial.id}/verdict` },
    dedupe: `verdict-ready:${trial.id}:${n}`,
    trialId: trial.id,
  });
}
