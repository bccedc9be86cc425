import { findRunMention, readRunChoice } from '../../lib/messages/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { findTemplateOf } from '../message/message.repository.ts';
import type { QueuedMessage } from '../message/message.service.ts';
import { confirmReading } from './confirm-reading.service.ts';
import { correctReading } from './correct-reading.service.ts';
import { logFigures } from './keep-figures.service.ts';
import { listReadings, setReadingStates } from './readings.repository.ts';
import { recordRun } from './record-run.service.ts';
import type { Reading, Run } from './run.ts';
import { findRunOf } from './run-reader.service.ts';
import { writeValues } from './run-words.ts';
import { readRunningTrial } from './running-trial.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { listClosedRunsOf } from './runs-in-hand.repository.ts';
import { type Talk, type TalkResult, writeSent } from './talk.service.ts';
import { keepReading, sayKept, submissionOf } from './talk-reading.service.ts';
import { answerUnread, askAgain } from './talk-unread.service.ts';
import { talkOf, tell } from './tell.service.ts';
import { figuresOf, setApart, valuesOf } from './text-figures.service.ts';

const minute = 60_000;

/** Leaves a question open with a phone. @param question.readingId the first of the readings it is about */
export function moveToQuestion(
  { scope, person }: Talk,
  run: Run,
  question: { readingId?: string | null; state: 'sure' | 'which'; sent: QueuedMessage },
): Promise<void> {
  const { readingId = null, state, sent } = question;
  const promptMessageId = sent.queued ? sent.id : null;
  return talkOf(scope, person.personId, state, { runId: run.id, readingId, promptMessageId });
}

/** The number equals one of the run's own settings: somebody may have texted the dial. */
export async function doubtAsSetting(talk: Talk, trial: RunningTrial, run: Run): Promise<TalkResult> {
  const { scope, person, text, reply } = talk;
  const figures = figuresOf(trial, reply.values);
  // Asked back once already: what is sent instead counts.
  if (run.state === 'doubtful') return keepReading(talk, trial, run, { asksBack: false });
  await recordRun(scope, { runId: run.id, figures, end: 'measured', isDoubted: true, ...submissionOf(talk) });
  const params = { run: run.number, values: writeSent(reply.values) };
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  const sent = await tell(scope, person.personId, { template: 'sameAsSetting', params }, about);
  await moveToQuestion(talk, run, { state: 'sure', sent });
  return { runId: run.id, isUsed: true };
}

/** Only waiting runs are open, and more than one: which of them is it? */
export async function askWhichRun(talk: Talk, trial: RunningTrial): Promise<TalkResult> {
  const { scope, person, text, reply, inHand } = talk;
  const [run] = inHand;
  if (!run) return answerUnread(talk);
  const readingId = await setApart(scope, run, figuresOf(trial, reply.values), submissionOf(talk));
  const runs = inHand.map(({ number }) => number).join(', ');
  const params = { values: writeSent(reply.values), runs };
  const about = { trialId: trial.id, because: text.id };
  const sent = await tell(scope, person.personId, { template: 'whichRun', params }, about);
  await moveToQuestion(talk, run, { readingId, state: 'which', sent });
  return { runId: run.id, isUsed: true };
}

/** The run that this person closed just before, in the same trial. */
async function findRunBefore({ scope, person }: Talk, trial: RunningTrial): Promise<Run | undefined> {
  const closed = await listClosedRunsOf(scope, person.personId);
  return closed.find(({ trialId, state }) => trialId === trial.id && state === 'done');
}

/** An answer sooner than a third of the shortest possible run may be meant for the run before. */
export async function askIfQuick(talk: Talk, trial: RunningTrial, run: Run): Promise<TalkResult | undefined> {
  const { scope, person, text, reply } = talk;
  const isNamed = findRunMention(text.body).run !== undefined;
  const third = (trial.shortestMinutes * minute) / 3;
  const isFirst = run.state === 'asked' && run.madeAt === null && run.askedAt !== null;
  // The service dates its list in whole seconds, so an answer may seem to come before its question: only a known length makes it quick.
  const isQuick = third > 0 && text.sentAt - (run.askedAt ?? 0) < third;
  if (!isFirst || isNamed || !isQuick) return undefined;
  const before = await findRunBefore(talk, trial);
  if (before === undefined) return undefined;
  const readingId = await setApart(scope, run, figuresOf(trial, reply.values), submissionOf(talk));
  const params = { run: run.number, before: before.number, values: writeSent(reply.values) };
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  const sent = await tell(scope, person.personId, { template: 'quick', params }, about);
  await moveToQuestion(talk, run, { readingId, state: 'which', sent });
  return { runId: run.id, isUsed: true };
}

/** What stands as asked back with the question that is open. */
async function pendingOf({ scope, conversation }: Talk): Promise<Reading[]> {
  if (conversation.runId === null) return [];
  const readings = await listReadings(scope, [conversation.runId]);
  const first = readings.find(({ id }) => id === conversation.readingId);
  return readings.filter(
    ({ state, inboxTextId }) =>
      state === 'asked back' && inboxTextId !== null && inboxTextId === first?.inboxTextId,
  );
}

/**
 * The answer to "which run": the number of one that was offered.
 * @returns undefined where the text is no such answer
 */
export async function chooseRun(talk: Talk): Promise<TalkResult | undefined> {
  const { scope, person, text, conversation, inHand } = talk;
  if (conversation.state !== 'which' || conversation.runId === null) return undefined;
  const asked = await findTemplateOf(scope, conversation.promptMessageId);
  if (asked !== 'whichRun' && asked !== 'quick') return undefined;
  const run = await findRunOf(scope, conversation.runId);
  const trial = await readRunningTrial(scope, run.trialId);
  const before = asked === 'quick' ? await findRunBefore(talk, trial) : undefined;
  const offered = before ? [before, run] : inHand.filter(({ trialId }) => trialId === trial.id);
  const number = readRunChoice(
    text.body,
    offered.map((one) => one.number),
  );
  const chosen = offered.find((one) => one.number === number);
  if (!chosen) return undefined;
  const pending = await pendingOf(talk);
  await setReadingStates(
    scope,
    pending.map(({ id }) => id),
    'not used',
  );
  await recordActivity(scope, {
    kind: 'reading.denied',
    subjectId: run.id,
    trialId: run.trialId,
    details: { run: run.number, before: logFigures(pending), after: [] },
  });
  const values = valuesOf(trial, pending);
  if (chosen.state !== 'done') {
    return keepReading(talk, trial, chosen, { asksBack: chosen.id !== run.id, values });
  }
  const figures = figuresOf(trial, values);
  await correctReading(scope, { runId: chosen.id, figures, end: 'measured', ...submissionOf(talk) });
  const lead = { what: 'saved', run: chosen.number, values: writeValues(figures) } as const;
  const about = { trialId: trial.id, runId: chosen.id, because: text.id };
  await tell(scope, person.personId, { template: 'noted', params: lead }, about);
  await talkOf(scope, person.personId, 'run', { runId: run.id });
  return { runId: chosen.id, isUsed: true };
}

/** Yes, the odd number is right: it counts. */
export async function acceptReading(talk: Talk): Promise<TalkResult> {
  const { scope, conversation } = talk;
  if (conversation.runId === null) return answerUnread(talk);
  const run = await findRunOf(scope, conversation.runId);
  // Somebody else may have settled it meanwhile.
  if (run.state !== 'doubtful') return { runId: run.id, isUsed: false };
  await confirmReading(scope, { runId: run.id, isRight: true });
  await sayKept(talk, await readRunningTrial(scope, run.trialId), run);
  return { runId: run.id, isUsed: true };
}

/** No, it is not: the run is open again, and asked for. */
export async function denyReading(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, conversation } = talk;
  if (conversation.runId === null) return answerUnread(talk);
  const run = await findRunOf(scope, conversation.runId);
  if (run.state !== 'doubtful') return { runId: run.id, isUsed: false };
  await confirmReading(scope, { runId: run.id, isRight: false });
  await askAgain(talk, await readRunningTrial(scope, run.trialId), run, text.id);
  await talkOf(scope, person.personId, 'results', { runId: run.id });
  return { runId: run.id, isUsed: true };
}
