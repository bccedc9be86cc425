import { randomInt } from 'node:crypto';
import { coreVersion, layOutCheckRuns, planCheckRuns } from '../../lib/doe/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import { findLatestPlan, insertPlan, insertRuns } from '../trial/plan.repository.ts';
import { hashOf } from '../trial/reviewed-hash.service.ts';
import { onePersonFor } from '../trial/start.service.ts';
import type { Trial } from '../trial/trial.ts';
import { findStep, type TrialReader, takeStep } from '../trial/trial-reader.service.ts';
import { beginCheckPhase, countRuns } from './check-runs.repository.ts';
import { findLatestVerdict } from './decide.service.ts';
import type { PlanCheckRuns } from './decision.schema.ts';

/**
 * Plans check runs in one step: best and usual settings mixed in pairs, numbered on after the trial's own, run and
 * texted like all others. Further pairs after a check that was not sure join those before.
 * @throws AppError `not-now` where today's settings are the advice, `forbidden`, `changed-meanwhile`
 */
export async function planChecks(
  scope: ShopScope,
  which: { trial: Trial } & PlanCheckRuns,
  reader: TrialReader,
): Promise<void> {
  const { trial, revision } = which;
  const step = await findStep(scope, trial, 'plan check runs', reader);
  const { facts } = await findLatestVerdict(scope, trial.id);
  const plan = await findLatestPlan(scope, trial.id, 'main');
  const last = await findLatestPlan(scope, trial.id);
  if (!plan || !last || facts.bet.keepToday) throw new AppError('not-now', { detail: 'nothing to check' });
  const wanted = which.pairs ?? facts.confirmation?.furtherPairs ?? planCheckRuns(facts.bet).each;
  const seed = randomInt(2 ** 31);
  const before = await countRuns(scope, trial.id);
  const runs = layOutCheckRuns(plan.brief, facts.bet.coded, Math.max(1, wanted), seed).map((run) => ({
    ...run,
    order: run.order + before,
  }));
  await takeStep(scope, trial, step, revision);
  const id = newId();
  const hash = hashOf(runs);
  await insertPlan(scope, {
    ...plan,
    id,
    trialId: trial.id,
    n: last.n + 1,
    phase: 'check',
    seed,
    coreVersion,
    hash,
    chosenBy: reader.personId,
  });
  const { answers } = await readStoredAnswers(scope, trial.id);
  await insertRuns(scope, { id, trialId: trial.id, runs }, onePersonFor(answers));
  await beginCheckPhase(scope, trial.id);
  await recordActivity(scope, {
    kind: 'trial.check-runs',
    subjectId: trial.id,
    trialId: trial.id,
    details: { pairs: runs.length / 2, seed, before: last.hash, after: hash },
  });
}
