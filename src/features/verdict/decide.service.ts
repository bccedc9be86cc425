import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { namesHazard } from '../trial/missing-answers.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, findSteps, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { announceAdoption } from './adopted.service.ts';
import { askSignOff, engineersBeside } from './ask-sign-off.service.ts';
import { insertDecision } from './decision.repository.ts';
import type { Adopt, NotNow, OpenAgain } from './decision.schema.ts';
import type { DecisionOutcome } from './decision.ts';
import { cancelCheckBacks } from './sign-off.repository.ts';
import type { StoredVerdict } from './stored-verdict.ts';
import { findVerdict } from './verdict.repository.ts';

/** The verdict that is acted on. @throws AppError `not-now` where there is none */
export async function findLatestVerdict(scope: ShopScope, trialId: string): Promise<StoredVerdict> {
  const verdict = await findVerdict(scope, trialId);
  if (!verdict) throw new AppError('not-now', { detail: 'the trial has no verdict' });
  return verdict;
}

async function isReviewDue(scope: ShopScope, trialId: string): Promise<boolean> {
  const { adoptionReview } = await findShop(scope);
  if (adoptionReview !== 'hazard') return adoptionReview === 'always';
  return namesHazard((await readStoredAnswers(scope, trialId)).answers);
}

function refuseField(pointer: string, code: string): AppError {
  return new AppError('invalid', { fields: [{ pointer, code }] });
}

async function keepDecision(
  scope: ShopScope,
  decision: {
    trial: Trial;
    verdict: StoredVerdict;
    outcome: DecisionOutcome;
    note: string;
    personId: string;
  },
): Promise<void> {
  const { trial, verdict, outcome, note, personId } = decision;
  await insertDecision(scope, {
    trialId: trial.id,
    verdictId: verdict.id,
    outcome,
    settings: outcome.startsWith('adopt') ? verdict.facts.bet.actual : [],
    note,
    decidedBy: personId,
  });
  await recordActivity(scope, {
    kind: 'trial.decided',
    subjectId: trial.id,
    trialId: trial.id,
    details: { outcome, verdict: verdict.n },
  });
}

/**
 * Takes the new settings over. They go to the engineer first where the shop's rules say so. Settings whose check runs did
 * not hold are taken over only as unchecked, with a reason.
 * @throws AppError `not-now`, `forbidden`, `changed-meanwhile`, `invalid` naming the field, `no-reviewer`
 */
export async function adopt(
  scope: ShopScope,
  which: { trial: Trial } & Adopt,
  reader: TrialReader,
): Promise<void> {
  const { trial, revision, unchecked, note } = which;
  const steps = await findSteps(scope, trial, 'adopt', reader);
  const verdict = await findLatestVerdict(scope, trial.id);
  const held = verdict.facts.confirmation?.outcome === 'held';
  if (!held && !unchecked) throw refuseField('#/unchecked', 'check-first');
  if (!held && note.length < 3) throw refuseField('#/note', 'missing');
  const due = await isReviewDue(scope, trial.id);
  const step = steps.find(({ when }) => when?.includes(due ? 'review due' : 'no review due'));
  if (!step) throw new RangeError('adopt: the table of states has no step for it');
  const engineers = due ? await engineersBeside(scope, reader.personId) : [];
  if (due && engineers.length === 0) throw new AppError('no-reviewer');
  await takeStep(scope, trial, step, revision);
  const outcome = held ? 'adopt' : 'adopt unchecked';
  await keepDecision(scope, { trial, verdict, outcome, note, personId: reader.personId });
  if (!due) return announceAdoption(scope, { trial, verdict });
  const asked = { hash: verdict.inputHash, askedBy: reader.personId, engineers };
  await askSignOff(scope, { trial, what: 'adoption', ...asked });
}

/** Leaves the machine as it is, for now or for good. @throws AppError `not-now`, `forbidden`, `changed-meanwhile` */
export async function leaveAsIs(
  scope: ShopScope,
  which: { trial: Trial } & NotNow,
  reader: TrialReader,
): Promise<void> {
  const { trial, revision, keepToday, note } = which;
  const step = await findStep(scope, trial, 'not now', reader);
  const verdict = await findLatestVerdict(scope, trial.id);
  await takeStep(scope, trial, step, revision);
  const outcome = keepToday ? "keep today's" : 'not now';
  await keepDecision(scope, { trial, verdict, outcome, note, personId: reader.personId });
}

/** Opens a closed trial again, with a reason. @throws AppError `not-now`, `forbidden`, `changed-meanwhile` */
export async function openAgain(
  scope: ShopScope,
  which: { trial: Trial } & OpenAgain,
  reader: TrialReader,
): Promise<void> {
  const { trial, revision, reason } = which;
  const step = await findStep(scope, trial, 'open again', reader);
  const verdict = await findLatestVerdict(scope, trial.id);
  await takeStep(scope, trial, step, revision);
  await insertDecision(scope, {
    trialId: trial.id,
    verdictId: verdict.id,
    outcome: 'opened again',
    settings: [],
    note: reason,
    decidedBy: reader.personId,
  });
  await cancelCheckBacks(scope, trial.id);
  await recordActivity(scope, { kind: 'trial.opened-again', subjectId: trial.id, trialId: trial.id });
}
