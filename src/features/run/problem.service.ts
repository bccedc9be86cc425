import { rolesMay } from '../../server/auth/permissions.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { Trial } from '../trial/trial.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { announceProblem } from './announce-problem.service.ts';
import type { CannotDecision } from './cannot-decision.ts';
import { beginStretch, type SaidChange } from './change-stretch.service.ts';
import { insertProblem, listOpenProblems, settleProblems } from './problem.repository.ts';
import type { ProblemKind } from './problem-kinds.ts';
import { touchBoard } from './run.repository.ts';
import { findRunOf, isBeingRun } from './run-reader.service.ts';
import { settleCannot } from './settle-cannot.service.ts';

export interface RaiseProblem {
  /** Sent twice, it is one problem. */
  id: string;
  trialId: string;
  runId: string | null;
  words: string;
  raisedBy: string | null;
  kind?: ProblemKind;
}

/**
 * Something is wrong at the machine. No prompt goes out until somebody has dealt with it; the run stays as it is.
 * @throws AppError `not-found`, `not-now` where nothing is being run
 */
export function raiseProblem(scope: ShopScope, problem: RaiseProblem): Promise<void> {
  const { trialId, runId } = problem;
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    if (!isBeingRun(trial)) throw new AppError('not-now', { detail: `a problem in ${trial.state}` });
    const run = runId === null ? null : await findRunOf(inner, runId);
    if (run && run.trialId !== trialId) throw new AppError('not-found', { detail: 'run of another trial' });
    if (!(await insertProblem(inner, problem))) return;
    await touchBoard(inner, trialId);
    const details = { run: run?.number ?? null, problem: problem.kind ?? 'problem' };
    await recordActivity(inner, { kind: 'problem.raised', subjectId: problem.id, trialId, details });
    if ((problem.kind ?? 'problem') === 'problem') await announceProblem(inner, { ...problem, run });
  });
}

function requireSupervisor(trial: Trial, reader: TrialReader): void {
  if (!rolesMay(reader.roles, 'trial.run')) throw new AppError('forbidden', { detail: 'lacks trial.run' });
  if (!isBeingRun(trial)) throw new AppError('not-now', { detail: `nothing is run in ${trial.state}` });
}

/** A problem was dealt with: prompts go on. What was repaired or changed for it begins a stretch. */
export async function settleProblem(
  scope: ShopScope,
  which: {
    trial: Trial;
    problemId: string;
    change?: SaidChange | undefined;
    decision?: CannotDecision | undefined;
  },
  reader: TrialReader,
): Promise<void> {
  const { trial, problemId, change, decision } = which;
  requireSupervisor(trial, reader);
  const open = (await listOpenProblems(scope, trial.id)).find(({ id }) => id === problemId);
  // Settled by somebody else meanwhile: that is just as well.
  const settled = await settleProblems(scope, { trialId: trial.id, id: problemId }, reader.personId);
  if (settled === 0) return;
  await touchBoard(scope, trial.id);
  await recordActivity(scope, { kind: 'problem.settled', subjectId: problemId, trialId: trial.id });
  if (change) await beginStretch(scope, trial.id, change);
  const runId = open?.kind === 'cannot' ? open.run_id : null;
  if (decision !== undefined && runId !== null) {
    await settleCannot(scope, { runId, decision, because: problemId });
  }
}

/** A problem that somebody signed in saw. */
export async function raiseProblemAs(
  scope: ShopScope,
  which: { trial: Trial; id: string; runId?: string | undefined; words: string },
  reader: TrialReader,
): Promise<void> {
  if (!rolesMay(reader.roles, 'problem.raise')) throw new AppError('forbidden');
  const { trial, id, words, runId = null } = which;
  await raiseProblem(scope, { id, trialId: trial.id, runId, words, raisedBy: reader.personId });
}

/** Something changed under the trial without a problem: a new batch, a repair. */
export async function sayChange(
  scope: ShopScope,
  which: { trial: Trial } & SaidChange,
  reader: TrialReader,
): Promise<void> {
  const { trial, kind, words } = which;
  requireSupervisor(trial, reader);
  await beginStretch(scope, trial.id, { kind, words });
}
