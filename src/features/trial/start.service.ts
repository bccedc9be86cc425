import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { freezeAnswers, readStoredAnswers } from './answers.repository.ts';
import type { Answers } from './answers.schema.ts';
import { keepPhrase, type PhraseTexts } from './phrase.repository.ts';
import { findLatestPlan, insertRuns, insertStart, type StoredPlan } from './plan.repository.ts';
import { layOutPlan } from './plan.service.ts';
import { findSecondPerson, requireComplete } from './readiness.service.ts';
import { findLatestReview } from './review.repository.ts';
import { openReview } from './review.service.ts';
import { hashOf, hashOfReviewed } from './reviewed-hash.service.ts';
import type { Trial } from './trial.ts';
import { changedMeanwhile, findStep, type TrialReader, takeStep } from './trial-reader.service.ts';

/** Who runs and who measures, where it is the same on every shift; else it is decided when a run's turn comes. */
export function onePersonFor(answers: Answers): { personId: string | null; measurerId: string | null } {
  const shifts = answers.crew?.shifts ?? [];
  const only = (ids: string[]) => (new Set(ids).size === 1 ? (ids[0] ?? null) : null);
  const runners = shifts.map(({ runs }) => runs?.trim() ?? '');
  const measurers = shifts.map(({ measures, runs }) => measures?.trim() || (runs?.trim() ?? ''));
  return { personId: only(runners), measurerId: only(measurers) };
}

/** The stop rules in the shop's own words go to its word list, for the next trial. */
async function keepOwnWords(scope: ShopScope, answers: Answers, writtenBy: string): Promise<void> {
  const spoken = Object.entries(answers.stop?.own ?? {})
    .map(([language, words]) => [language, words?.trim() ?? ''] as const)
    .filter(([, words]) => words !== '');
  if (spoken.length === 0) return;
  const texts: PhraseTexts = Object.fromEntries(spoken);
  await keepPhrase(scope, { purpose: 'stop rule', texts, hash: hashOf(texts), writtenBy });
}

/**
 * From a draft only where nobody else must agree, or nobody else could and that is then on record; from ready only with
 * what was agreed to.
 */
async function requireAgreement(
  scope: ShopScope,
  trial: Trial,
  about: { answers: Answers; plan: StoredPlan },
  reader: TrialReader,
): Promise<{ hash: string; isUnchecked: boolean }> {
  const hash = hashOfReviewed(about.answers, about.plan);
  if (trial.state === 'ready') {
    const review = await findLatestReview(scope, trial.id, 'plan');
    if (review?.state === 'approved' && review.subject_hash === hash) return { hash, isUnchecked: false };
    throw await changedMeanwhile(scope, trial.id);
  }
  const second = await findSecondPerson(scope, about, reader.personId);
  if (second === 'needed') throw new AppError('not-now', { detail: 'a second person must agree' });
  if (second === 'missing') throw new AppError('no-reviewer');
  return { hash, isUnchecked: second === 'alone' };
}

/**
 * Starts a trial, in the transaction at hand: the answers freeze, the runs are written as the plan lays them out, all
 * waiting for their turn.
 * @throws AppError `invalid` naming what is missing, `not-now`, `no-reviewer`, `changed-meanwhile`
 */
export async function startTrial(
  scope: ShopScope,
  which: { trial: Trial; revision: number },
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  const step = await findStep(scope, trial, 'start', reader);
  const { answers, version } = await readStoredAnswers(scope, trial.id);
  const latest = await findLatestPlan(scope, trial.id);
  const plan = await requireComplete(scope, { answers, plan: latest, ready: true });
  const { hash, isUnchecked } = await requireAgreement(scope, trial, { answers, plan }, reader);
  await takeStep(scope, trial, step, revision);
  if (isUnchecked) {
    await openReview(scope, {
      trial_id: trial.id,
      subject: 'plan',
      subject_hash: hash,
      state: 'unchecked',
      personId: reader.personId,
    });
  }
  const frozenHash = hashOf(answers);
  if (!(await freezeAnswers(scope, { trialId: trial.id, version, hash: frozenHash }))) {
    throw await changedMeanwhile(scope, trial.id);
  }
  await insertStart(scope, trial.id);
  const runs = layOutPlan(plan);
  await insertRuns(scope, { id: plan.id, trialId: trial.id, runs }, onePersonFor(answers));
  await keepOwnWords(scope, answers, reader.personId);
  await recordActivity(scope, {
    kind: 'trial.started',
    subjectId: trial.id,
    trialId: trial.id,
    details: { answers: frozenHash, plan: plan.hash, runs: runs.length, unchecked: isUnchecked },
  });
}
