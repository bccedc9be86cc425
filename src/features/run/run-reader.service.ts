import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findLatestPlan, type StoredPlan } from '../trial/plan.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import type { TrialState } from '../trial/trial-states.ts';
import { settleProblemsOfRun } from './problem.repository.ts';
import { findRun, type RunChange, touchBoard, updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import { type RunEvent, type RunStep, runStepOf } from './run-states.ts';

/** @throws AppError `not-found`, for another shop's run too */
export async function findRunOf(scope: ShopScope, id: string): Promise<Run> {
  const run = await findRun(scope, id);
  if (!run) throw new AppError('not-found', { detail: 'no such run' });
  return run;
}

/** Somebody was faster: what the run is now goes along. */
export async function runChangedMeanwhile(scope: ShopScope, runId: string): Promise<AppError> {
  const { id, state, end, revision } = await findRunOf(scope, runId);
  return new AppError('changed-meanwhile', { present: { id, state, end, revision } });
}

/** @throws AppError `not-now` where an event leads nowhere from the run's state */
export function requireRunStep(run: Run, event: RunEvent): RunStep {
  const step = runStepOf(run.state, event);
  if (!step) throw new AppError('not-now', { detail: `${event} of a run that is ${run.state}` });
  return step;
}

/** Takes a run one step on if it is still as it was seen, and tells every board. @throws AppError `changed-meanwhile` */
export async function takeRunStep(
  scope: ShopScope,
  run: Run,
  step: RunStep,
  change: RunChange & { revision?: number | undefined },
): Promise<void> {
  const { revision = run.revision, ...columns } = change;
  const which = { id: run.id, from: [step.from], revision };
  if (!(await updateRun(scope, which, { ...columns, state: step.to }))) {
    throw await runChangedMeanwhile(scope, run.id);
  }
  if (step.to === 'done' || step.to === 'skipped') await settleProblemsOfRun(scope, run.id);
  await touchBoard(scope, run.trialId);
}

/** Runs are made in these; in the last two nothing is asked for, yet what comes in is kept. */
const runningStates: readonly TrialState[] = ['running', 'paused', 'held'];

export function isBeingRun({ state }: Pick<Trial, 'state'>): boolean {
  return runningStates.includes(state);
}

/** The trial of a run that is under way. @throws AppError `not-now` before its start and after its readings are in */
export async function requireBeingRun(scope: ShopScope, run: Run): Promise<Trial> {
  const trial = await findTrialOf(scope, run.trialId);
  if (!isBeingRun(trial)) throw new AppError('not-now', { detail: `a run of a trial in ${trial.state}` });
  return trial;
}

/** The plan that a trial's runs stand on. */
export async function requirePlan(scope: ShopScope, trialId: string): Promise<StoredPlan> {
  const plan = await findLatestPlan(scope, trialId);
  if (!plan) throw new RangeError('requirePlan: trialId has no plan');
  return plan;
}
