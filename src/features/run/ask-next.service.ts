import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readConversation } from '../message/conversation.repository.ts';
import { areTextsUsedUp } from '../message/monthly-texts.service.ts';
import type { Lead } from '../message/run-prompt.ts';
import { askWhoIsOn } from './line-phone.service.ts';
import { listOpenProblems } from './problem.repository.ts';
import { blockingKinds } from './problem-kinds.ts';
import { listRuns } from './run.repository.ts';
import type { Run } from './run.ts';
import { findOnDuty, readTimeZone } from './run-people.service.ts';
import { findRunOf, requireRunStep, takeRunStep } from './run-reader.service.ts';
import { describePrompt } from './run-words.ts';
import type { RunningTrial } from './running-trial.ts';
import { hasRunToMake } from './runs-in-hand.repository.ts';
import { shiftAt, startMoment } from './shift.ts';
import { findStretch } from './stretch.repository.ts';
import { talkOf, tell } from './tell.service.ts';

const minute = 60_000;

export interface Asked {
  run: Run;
  personId: string;
}

/**
 * Sends the trial's next run to whoever makes runs now, if it is time: the trial runs, nothing is in the way, the run
 * before is made, the phone is free over all trials, and the person is at work and has agreed. Call it in a transaction.
 * @param options.lead what has just come in from `options.from`; stands above the run when it goes to the same person
 * @param options.isWished the crew asked for it (GO), or the supervisor sends it now
 * @returns undefined when nothing was sent
 */
export async function askNextRun(
  scope: ShopScope,
  trial: RunningTrial,
  options: { lead?: Lead; from?: string; isWished?: boolean } = {},
): Promise<Asked | undefined> {
  if (trial.state !== 'running') return undefined;
  if (await areTextsUsedUp(scope)) return undefined;
  const problems = await listOpenProblems(scope, trial.id);
  if (problems.some(({ kind }) => blockingKinds.includes(kind))) return undefined;
  const runs = await listRuns(scope, trial.id);
  const run = runs.find(({ state }) => state === 'waiting');
  const timeZone = await readTimeZone(scope);
  if (!run || !isItsTurn(trial, runs, { timeZone, isWished: options.isWished ?? false })) return undefined;

  const shift = shiftAt(trial, now(), timeZone);
  const personId = run.personId ?? shift?.runs;
  if (personId === undefined) return undefined;
  const person = await findOnDuty(scope, trial, personId);
  if (person === null || (await hasRunToMake(scope, personId))) return undefined;
  // A question that waits for its answer on that phone would be lost under the next run.
  const { state: talk } = await readConversation(scope, personId);
  if (talk === 'sure' || talk === 'which') return undefined;

  const measurerId = run.measurerId ?? shift?.measures ?? personId;
  const asked = await ask(scope, trial, { run, personId, measurerId });
  const { lead } = options;
  const prompt = describePrompt(trial, asked, runs.length);
  const params = lead && options.from === personId ? { ...prompt, lead } : prompt;
  await askWhoIsOn(scope, trial, personId);
  const sent = await tell(
    scope,
    personId,
    { template: 'runPrompt', params },
    { trialId: trial.id, runId: run.id, because: `${run.id}:${asked.revision}` },
  );
  await talkOf(scope, personId, 'run', { runId: run.id, promptMessageId: sent.queued ? sent.id : null });
  return { run: asked, personId };
}

/** Marks a run as asked of a person. The message that says so is the caller's. */
async function ask(
  scope: ShopScope,
  trial: RunningTrial,
  wish: { run: Run; personId: string; measurerId: string },
): Promise<Run> {
  const { run, personId, measurerId } = wish;
  const at = now();
  await takeRunStep(scope, run, requireRunStep(run, 'ask'), {
    personId,
    measurerId,
    stretchId: await findStretch(scope, trial.id),
    label: run.label ?? trial.label,
    askedAt: at,
    remindAt: at + trial.remindMinutes * minute,
  });
  const details = { run: run.number };
  await recordActivity(scope, { kind: 'run.asked', subjectId: run.id, trialId: trial.id, details });
  return findRunOf(scope, run.id);
}

/** Whether the pace lets the next run go out: one machine, one run at a time. */
function isItsTurn(
  trial: RunningTrial,
  runs: readonly Run[],
  { timeZone, isWished }: { timeZone: string; isWished: boolean },
): boolean {
  const at = now();
  const isBeingMade = runs.some(
    ({ state }) => state === 'asked' || (state === 'doubtful' && !trial.resultsLater),
  );
  // With results at once, what is still missing of the last run comes first.
  const isBeingMeasured = !trial.resultsLater && runs.some(({ state }) => state === 'made');
  const lastAskedAt = Math.max(0, ...runs.map(({ askedAt }) => askedAt ?? 0));
  if (isBeingMade || isBeingMeasured) return false;
  if (isWished) return true;
  if ((startMoment(trial, timeZone) ?? 0) > at) return false;
  if (trial.pace.next === 'go' && lastAskedAt > 0) return false;
  return trial.pace.next !== 'every' || at >= lastAskedAt + trial.pace.everyMinutes * minute;
}
