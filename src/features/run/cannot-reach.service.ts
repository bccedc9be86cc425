import type { ShopScope } from '../../server/db/scope.ts';
import { raiseProblem } from './problem.service.ts';
import { touchBoard, updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import type { RunningTrial } from './running-trial.ts';
import { tellCaller } from './tell.service.ts';

/** When a run is reminded of; null: not until somebody else has decided. */
export async function remindLater(scope: ShopScope, run: Run, remindAt: number | null): Promise<void> {
  await updateRun(scope, { id: run.id, from: [run.state] }, { remindAt });
  await touchBoard(scope, run.trialId);
}

/**
 * A setting cannot be reached: the run stays without reminders, and whoever is called decides what to do with it. Call it
 * in a transaction.
 * @param said.id names the report, so that it is taken once
 * @param said.actual how far it got, as it was said
 */
export async function reportCannotReach(
  scope: ShopScope,
  about: { trial: RunningTrial; run: Run },
  said: { id: string; words: string; actual: string; by: { personId: string; name: string } },
): Promise<void> {
  const { trial, run } = about;
  const { id, words, actual, by } = said;
  await remindLater(scope, run, null);
  await raiseProblem(scope, {
    ...{ id, words, trialId: trial.id, runId: run.id },
    raisedBy: by.personId,
    kind: 'cannot',
  });
  const params = { machine: trial.machine, run: run.number, name: by.name, actual };
  await tellCaller(scope, trial, { template: 'cannotReach', params }, { because: id, runId: run.id });
}
