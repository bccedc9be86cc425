import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { countMessages } from '../message/message.repository.ts';
import { areTextsUsedUp } from '../message/monthly-texts.service.ts';
import { workerScope } from '../message/sending.service.ts';
import { askNextRun } from './ask-next.service.ts';
import { findRun, touchBoard, updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import { findOnDuty } from './run-people.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { listDueReminders, listTrialsToServe } from './runs-in-hand.repository.ts';
import { tell, tellCaller } from './tell.service.ts';

const minute = 60_000;

/** Sends every run whose turn it is. @returns how many went out */
export async function askDueRuns(db: Knex): Promise<number> {
  let asked = 0;
  for (const { shopId, trialId } of await listTrialsToServe(db)) {
    const sent = await inTransaction(workerScope(db, shopId), async (scope) =>
      askNextRun(scope, await readRunningTrial(scope, trialId)),
    );
    if (sent) asked += 1;
  }
  return asked;
}

/** Reminds of runs that are still open; when the reminders are used up, tells whoever is called. @returns how many */
export async function remindOfRuns(db: Knex): Promise<number> {
  const due = await listDueReminders(db, now());
  for (const { shopId, runId } of due) {
    await inTransaction(workerScope(db, shopId), async (scope) => {
      const run = await findRun(scope, runId);
      if (run === null || run.remindAt === null || run.remindAt > now()) return;
      await remind(scope, await readRunningTrial(scope, run.trialId), run);
    });
  }
  return due.length;
}

async function remind(scope: ShopScope, trial: RunningTrial, run: Run): Promise<void> {
  // The month's texts are used up: the run waits on the board, which says so.
  if (await areTextsUsedUp(scope)) {
    const later = now() + trial.remindMinutes * minute;
    await updateRun(scope, { id: run.id, from: [run.state] }, { remindAt: later });
    return;
  }
  const isMade = run.state !== 'asked';
  const holderId = isMade ? run.measurerId : run.personId;
  const person = holderId === null ? null : await findOnDuty(scope, trial, holderId);
  const since = run.madeAt ?? run.askedAt ?? 0;
  const sent = await countMessages(scope, { template: 'remind', runId: run.id, since });
  if (person === null || sent >= trial.remindTimes) return escalate(scope, trial, run, holderId);
  const remindAt = now() + trial.remindMinutes * minute;
  await updateRun(scope, { id: run.id, from: [run.state] }, { remindAt });
  const later = !isMade && trial.resultsLater;
  const params = { run: run.number, machine: trial.machine, later };
  const about = { trialId: trial.id, runId: run.id, because: `${run.id}:${run.revision}` };
  await tell(scope, person.personId, { template: 'remind', params }, about);
}

/** Nobody answers, or the shift is over: the person on call is told once, then the run waits. */
async function escalate(
  scope: ShopScope,
  trial: RunningTrial,
  run: Run,
  holderId: string | null,
): Promise<void> {
  await updateRun(scope, { id: run.id, from: [run.state] }, { remindAt: null });
  await touchBoard(scope, trial.id);
  const holder = holderId === null ? null : await findAddressee(scope, holderId);
  const params = { machine: trial.machine, run: run.number, name: holder?.name ?? '' };
  await tellCaller(
    scope,
    trial,
    { template: 'noAnswer', params },
    { because: `${run.id}:${run.revision}`, runId: run.id },
  );
}
