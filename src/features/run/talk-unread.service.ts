import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { countAutoReply } from '../message/conversation.repository.ts';
import { listOpenProblems } from './problem.repository.ts';
import { raiseProblem } from './problem.service.ts';
import type { Run } from './run.ts';
import { isBeingRun } from './run-reader.service.ts';
import { askFor } from './run-words.ts';
import type { RunItem, RunningTrial } from './running-trial.ts';
import type { Talk, TalkResult } from './talk.service.ts';
import { tell, tellCaller } from './tell.service.ts';
import { missingItems } from './text-figures.service.ts';

const hour = 3_600_000;

/** What a run is asked for next. */
export async function nextItem(scope: ShopScope, trial: RunningTrial, run: Run): Promise<RunItem> {
  const [missing] = await missingItems(scope, trial, run.id);
  const item = missing ?? trial.items[0];
  if (!item) throw new RangeError('nextItem: trial has no result');
  return item;
}

/** Asks for the numbers of a run again, all in one text. */
export async function askAgain(talk: Talk, trial: RunningTrial, run: Run, because: string): Promise<void> {
  const { scope, person } = talk;
  if (!(await mayAnswer(talk, trial))) return;
  const params = { run: run.number, ask: askFor(await nextItem(scope, trial, run)) };
  const about = { trialId: trial.id, runId: run.id, because };
  await tell(scope, person.personId, { template: 'howMany', params }, about);
}

/**
 * One short, kind answer to what could not be read, saying what to send: once a prompt, and at most three an hour to a
 * phone. After that the text only stands in the talk, and whoever is called is told.
 */
export async function answerUnread(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, focus, trial, reply, conversation } = talk;
  const runId = focus?.id ?? null;
  if (trial === null) return { runId, isUsed: false };
  if (focus !== null && reply.ask === 'howMany') {
    await askAgain(talk, trial, focus, text.id);
    return { runId, isUsed: false };
  }
  if (!(await mayAnswer(talk, trial))) return { runId, isUsed: false };
  const prompt = conversation.promptMessageId ?? `${runId ?? trial.id}:${Math.floor(now() / (12 * hour))}`;
  const about = { trialId: trial.id, because: prompt, ...(runId === null ? {} : { runId }) };
  if (focus === null) {
    await tell(scope, person.personId, { template: 'unreadIdle', params: {} }, about);
  } else {
    const params = { run: focus.number, ask: askFor(await nextItem(scope, trial, focus)) };
    await tell(scope, person.personId, { template: 'unread', params }, about);
  }
  return { runId, isUsed: false };
}

/** Whether this phone may get one more answer of this kind within the hour; else somebody is told to have a look. */
async function mayAnswer({ scope, person, text, focus }: Talk, trial: RunningTrial): Promise<boolean> {
  if (await countAutoReply(scope, person.personId, now())) return true;
  const open = await listOpenProblems(scope, trial.id);
  const isKnown = open.some(({ kind, raised_by }) => kind === 'unread' && raised_by === person.personId);
  if (isKnown || !isBeingRun(trial)) return false;
  const id = newId();
  const words = text.body.trim();
  const runId = focus?.id ?? null;
  const problem = { id, trialId: trial.id, runId, words, raisedBy: person.personId, kind: 'unread' } as const;
  await raiseProblem(scope, problem);
  const params = { name: person.name, machine: trial.machine };
  await tellCaller(scope, trial, { template: 'unreadTexts', params }, { because: id });
  return false;
}
