import type { ShopScope } from '../../server/db/scope.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import { findLatestReview } from '../trial/review.repository.ts';
import { reviewSubjects } from '../trial/review.schema.ts';
import type { Trial } from '../trial/trial.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import type { TrialState } from '../trial/trial-states.ts';
import { findVerdict } from '../verdict/verdict.repository.ts';
import type { AuditFrameView } from './audit-view.ts';

const readIn: readonly TrialState[] = [
  'readings in',
  'verdict review',
  'deciding',
  'adoption review',
  'closed',
];

/** Whether the effects of a trial may be looked at. */
export async function isJudged(scope: ShopScope, trial: Trial): Promise<boolean> {
  return readIn.includes(trial.state) || (await findVerdict(scope, trial.id)) !== null;
}

async function whatWaits(scope: ShopScope, trialId: string): Promise<AuditFrameView['waitsFor']> {
  for (const subject of reviewSubjects) {
    const review = await findLatestReview(scope, trialId, subject);
    if (review?.state === 'asked') return subject;
  }
  return null;
}

/** @throws AppError `not-found`, for another shop's trial too */
export async function readAuditFrame(scope: ShopScope, trialId: string): Promise<AuditFrameView> {
  const trial = await findTrialOf(scope, trialId);
  const plan = await findLatestPlan(scope, trialId, 'main');
  const check = await findLatestPlan(scope, trialId, 'check');
  const specs = plan ? [plan.brief.response, ...plan.brief.watch] : [];
  return {
    trialId,
    title: trial.title,
    number: trial.number,
    machine: trial.machine,
    state: trial.state,
    results: specs.map(({ name, unit }) => ({ name, unit })),
    hasPlan: plan !== null,
    isJudged: plan !== null && (await isJudged(scope, trial)),
    hasCheckRuns: check !== null,
    waitsFor: await whatWaits(scope, trialId),
  };
}
