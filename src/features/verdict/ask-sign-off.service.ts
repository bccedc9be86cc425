import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findLatestReview } from '../trial/review.repository.ts';
import { openReview } from '../trial/review.service.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { listEngineers } from './sign-off.repository.ts';
import { type SignOffSubject, tellEngineers } from './sign-off-messages.service.ts';
import { findVerdict } from './verdict.repository.ts';

/** The engineers who may look at what somebody asks: all but that person. */
export async function engineersBeside(scope: ShopScope, personId: string): Promise<string[]> {
  return (await listEngineers(scope)).filter((id) => id !== personId);
}

/** Asks the engineers, and tells them. */
export async function askSignOff(
  scope: ShopScope,
  about: {
    trial: Trial;
    what: SignOffSubject;
    hash: string;
    askedBy: string;
    engineers: readonly string[];
  },
): Promise<void> {
  const { trial, what, hash, askedBy, engineers } = about;
  const id = await openReview(scope, {
    trial_id: trial.id,
    subject: what,
    subject_hash: hash,
    state: 'asked',
    personId: askedBy,
  });
  await tellEngineers(scope, { trial, what, review: { id, askedBy }, engineers });
}

/** Whether an engineer has sent back exactly this verdict: then it is not asked about again by itself. */
export async function wasSentBack(scope: ShopScope, trialId: string, inputHash: string): Promise<boolean> {
  const review = await findLatestReview(scope, trialId, 'verdict');
  return review?.state === 'sent back' && review.subject_hash === inputHash;
}

/**
 * Asks once more about a verdict that was sent back, where the remark needed no other reading.
 * @throws AppError `not-now`, `forbidden`, `changed-meanwhile`, `no-reviewer`
 */
export async function askVerdictAgain(
  scope: ShopScope,
  which: { trial: Trial; revision: number },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  const step = await findStep(scope, trial, 'send for review', reader);
  const verdict = await findVerdict(scope, trial.id);
  if (!verdict || !(await wasSentBack(scope, trial.id, verdict.inputHash)))
    throw new AppError('not-now', { detail: 'no verdict was sent back' });
  const engineers = await engineersBeside(scope, reader.personId);
  if (engineers.length === 0) throw new AppError('no-reviewer');
  await takeStep(scope, trial, step, revision);
  const asked = { hash: verdict.inputHash, askedBy: reader.personId, engineers };
  await askSignOff(scope, { trial, what: 'verdict', ...asked });
}
