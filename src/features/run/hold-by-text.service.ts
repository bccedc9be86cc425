import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { transitionsOf } from '../trial/trial-states.ts';
import { holdTrial } from './hold-trial.service.ts';
import { raiseProblem } from './problem.service.ts';
import { listRuns, updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import { crewOf } from './run-people.service.ts';
import { isBeingRun, requireRunStep, takeRunStep } from './run-reader.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { listRunsInHand } from './runs-in-hand.repository.ts';
import { listTrialsAtMachine } from './set-back.repository.ts';
import type { Talk, TalkResult } from './talk.service.ts';
import { tellCaller } from './tell.service.ts';

/** The trials that somebody who texts DANGER may mean: those of the runs in hand, and those whose crew they are in. */
async function listOwnTrials(scope: ShopScope, personId: string): Promise<RunningTrial[]> {
  const own: RunningTrial[] = [];
  for (const id of await listTrialsAtMachine(scope)) {
    const trial = await readRunningTrial(scope, id);
    const runs = await listRuns(scope, id);
    const hadRun = runs.some((run) => run.personId === personId || run.measurerId === personId);
    if (hadRun || crewOf(trial).includes(personId)) own.push(trial);
  }
  return own;
}

/** DANGER by text: holds every trial it may mean. One that cannot be held any more has it on top of its board. */
export async function holdByText(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, inHand } = talk;
  const own = await listOwnTrials(scope, person.personId);
  for (const { id: trialId, state } of own) {
    if (transitionsOf(state, 'hold').length > 0) await holdTrial(scope, trialId);
    else if (isBeingRun({ state })) {
      const danger = { words: text.body.trim(), raisedBy: person.personId, kind: 'danger' } as const;
      await raiseProblem(scope, { ...danger, id: newId(), trialId, runId: inHand[0]?.id ?? null });
    }
  }
  return { runId: inHand[0]?.id ?? null, isUsed: own.length > 0 };
}

/** A run whose maker takes no more texts waits for another; one that is made waits without reminders. */
async function giveBack(scope: ShopScope, run: Run): Promise<void> {
  if (run.state === 'asked') {
    await takeRunStep(scope, run, requireRunStep(run, 'take back'), { personId: null, remindAt: null });
  } else {
    await updateRun(scope, { id: run.id, from: [run.state] }, { remindAt: null });
  }
}

/**
 * Somebody with an open run texted STOP: they get no more texts, their run waits, and the board says to go and see,
 * because they may have meant the machine. Call it in the transaction of the opt-out, after it.
 */
export async function holdRunsOfOptOut(scope: ShopScope, personId: string): Promise<void> {
  for (const run of await listRunsInHand(scope, personId)) {
    const trial = await readRunningTrial(scope, run.trialId);
    await giveBack(scope, run);
    const id = newId();
    const problem = { id, trialId: trial.id, runId: run.id, words: 'STOP', raisedBy: personId } as const;
    await raiseProblem(scope, { ...problem, kind: 'stop' });
    const name = (await findAddressee(scope, personId))?.name ?? '';
    const params = { machine: trial.machine, run: run.number, name };
    const about = { because: id, runId: run.id, urgent: true };
    await tellCaller(scope, trial, { template: 'stopTexted', params }, about);
  }
}
