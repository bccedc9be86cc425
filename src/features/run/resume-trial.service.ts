import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { namesHazard } from '../trial/missing-answers.ts';
import type { Trial } from '../trial/trial.ts';
import { listReviewers } from '../trial/trial-people.repository.ts';
import { findStep, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { announceResume } from './announce-resume.service.ts';
import { beginStretch, type SaidChange } from './change-stretch.service.ts';
import { closeIfLastRun } from './close-trial.service.ts';
import { insertNote } from './note.repository.ts';

/**
 * Who may start a trial again after a stop for safety: with a hazard, where plans are ever reviewed, only an engineer or
 * the safety person; else whoever runs it.
 */
export async function whoResumes(scope: ShopScope, trial: Trial): Promise<'anybody' | 'reviewer'> {
  if (trial.state !== 'held') return 'anybody';
  const { planReview } = await findShop(scope);
  const { answers } = await readStoredAnswers(scope, trial.id);
  return planReview !== 'never' && namesHazard(answers) ? 'reviewer' : 'anybody';
}

/**
 * Goes on with a trial, in the transaction at hand. After a stop for safety somebody says in writing why it is safe.
 * @throws AppError `invalid` without a reason, `forbidden`, `not-now`, `changed-meanwhile`
 */
export async function resumeTrial(
  scope: ShopScope,
  which: {
    trial: Trial;
    revision: number;
    /** The note's id, so that the reason is kept once. */
    id: string;
    reason: string;
    change?: SaidChange | undefined;
  },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision, id, reason, change } = which;
  const step = await findStep(scope, trial, 'resume', reader);
  if (trial.state === 'held') {
    const isReviewer = (await listReviewers(scope)).includes(reader.personId);
    if ((await whoResumes(scope, trial)) === 'reviewer' && !isReviewer) {
      throw new AppError('forbidden', { detail: 'an engineer or safety person starts it again' });
    }
    if (reason === '') {
      throw new AppError('invalid', { fields: [{ pointer: '#/reason', code: 'missing' }] });
    }
  }
  await takeStep(scope, trial, step, revision);
  if (reason !== '') {
    await insertNote(scope, {
      id,
      trialId: trial.id,
      runId: null,
      words: reason,
      writtenBy: reader.personId,
    });
  }
  await recordActivity(scope, {
    kind: 'trial.resumed',
    subjectId: trial.id,
    trialId: trial.id,
    details: { from: step.from, reason: reason === '' ? null : id },
  });
  if (change) await beginStretch(scope, trial.id, change);
  if (step.from === 'held') await announceResume(scope, trial.id);
  // All runs may have been typed in while it stood still.
  await closeIfLastRun(scope, trial.id);
}
