import { layOutRuns, type PlannedRun, powerCurve } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { listRuns } from '../run/run.repository.ts';
import type { Run } from '../run/run.ts';
import { findLatestPlan, type StoredPlan } from '../trial/plan.repository.ts';
import { listFactors } from './audit-factors.ts';
import type { AuditPlanView } from './audit-view.ts';

function toPlannedRun(run: Run): PlannedRun {
  return {
    order: run.place,
    standard: run.number,
    block: run.block,
    ...(run.wholePlot === null ? {} : { wholePlot: run.wholePlot }),
    group: run.group,
    center: run.center,
    coded: run.coded,
    actual: run.planned,
  };
}

/** Before the start there are no rows: the runs are laid out as the start will. */
function mainRuns(plan: StoredPlan, rows: readonly Run[]): PlannedRun[] {
  const laidOut = layOutRuns(plan.brief, plan.proposal, plan.seed);
  const own = rows.filter(({ planId, warmUp }) => planId === plan.id && !warmUp);
  if (own.length === 0) return laidOut;
  const standard = new Map(laidOut.map((run) => [run.order, run.standard]));
  return own.map((run) => ({ ...toPlannedRun(run), standard: standard.get(run.number) ?? run.number }));
}

/** The plan of a trial as it was chosen; null while none is. */
export async function readAuditPlan(scope: ShopScope, trialId: string): Promise<AuditPlanView | null> {
  const plan = await findLatestPlan(scope, trialId, 'main');
  if (!plan) return null;
  const check = await findLatestPlan(scope, trialId, 'check');
  const rows = await listRuns(scope, trialId);
  return {
    brief: plan.brief,
    proposal: plan.proposal,
    factors: listFactors(plan.brief),
    n: plan.n,
    seed: plan.seed,
    coreVersion: plan.coreVersion,
    hash: plan.hash,
    runs: mainRuns(plan, rows),
    // Further pairs after a check that was not sure are a plan of their own; they are one set of check runs.
    checks: check
      ? { seed: check.seed, runs: rows.filter(({ planId }) => planId !== plan.id).map(toPlannedRun) }
      : null,
    power: powerCurve(plan.proposal),
  };
}
