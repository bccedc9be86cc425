import type { Reply } from '../../lib/messages/index.ts';
import { readReply } from '../../lib/messages/index.ts';
import { newId } from '../../server/ids.ts';
import { correctReading } from './correct-reading.service.ts';
import { raiseProblem } from './problem.service.ts';
import type { Run } from './run.ts';
import { findCaller } from './run-people.service.ts';
import { isBeingRun, requireRunStep, takeRunStep } from './run-reader.service.ts';
import { writeValues } from './run-words.ts';
import { readRunningTrial } from './running-trial.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { listClosedRunsOf } from './runs-in-hand.repository.ts';
import { expectationOf, type Talk, type TalkResult, writeSent } from './talk.service.ts';
import { moveToQuestion } from './talk-questions.service.ts';
import { keepReading, submissionOf } from './talk-reading.service.ts';
import { answerUnread, askAgain } from './talk-unread.service.ts';
import { talkOf, tell, tellCaller } from './tell.service.ts';
import { countingFigures, figuresOf, plausibleRanges, setApart } from './text-figures.service.ts';

/** Reads the text once more, as one about this run with all its results. */
async function readFor(talk: Talk, trial: RunningTrial, run: Run): Promise<Reply> {
  const { scope, person, text, inHand } = talk;
  const ranges = await plausibleRanges(scope, trial);
  const { language } = person;
  return readReply(text.body, expectationOf(trial, { run, items: trial.items, inHand, ranges, language }));
}

/**
 * A reading for nothing that is open: a second one for a run that is done is kept and asked about; one for a run that
 * was closed otherwise goes to whoever is called; one for nothing at all is answered so.
 */
export async function takeStray(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, reply } = talk;
  const closed = await listClosedRunsOf(scope, person.personId);
  const named = reply.run === undefined ? undefined : closed.find(({ number }) => number === reply.run);
  const run = named ?? (reply.run === undefined ? closed[0] : undefined);
  if (!run) return answerNoRun(talk);
  const trial = await readRunningTrial(scope, run.trialId);
  const read = await readFor(talk, trial, run);
  const isOpenTrial = ['running', 'paused', 'held', 'readings in'].includes(trial.state);
  if (run.state === 'done' && isOpenTrial && read.values !== undefined) {
    return askWhichReading({ ...talk, reply: read }, trial, run);
  }
  if (named === undefined) return answerNoRun(talk);
  const words = text.body.trim();
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  if (isBeingRun(trial)) {
    const late = {
      trialId: trial.id,
      runId: run.id,
      words,
      raisedBy: person.personId,
      kind: 'late',
    } as const;
    await raiseProblem(scope, { ...late, id: newId() });
  }
  const params = { machine: trial.machine, run: run.number, name: person.name, words };
  const caller = await tellCaller(scope, trial, { template: 'lateReading', params }, about);
  const closedRun = { run: run.number, caller: caller.name };
  await tell(scope, person.personId, { template: 'closedRun', params: closedRun }, about);
  return { runId: run.id, isUsed: false };
}

/** Two readings for one run: both are kept, and the person says which is right. */
async function askWhichReading(talk: Talk, trial: RunningTrial, run: Run): Promise<TalkResult> {
  const { scope, person, text, reply } = talk;
  const figures = figuresOf(trial, reply.values);
  const counting = (await countingFigures(scope, run.id)).filter(({ result }) =>
    figures.some((one) => one.result === result),
  );
  // The very same numbers sent again are no second reading.
  if (writeValues(counting) === writeValues(figures)) return { runId: run.id, isUsed: true };
  const readingId = await setApart(scope, run, figures, submissionOf(talk));
  await takeRunStep(scope, run, requireRunStep(run, 'second reading'), {});
  const params = { run: run.number, before: writeValues(counting), values: writeSent(reply.values) };
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  const sent = await tell(scope, person.personId, { template: 'whichReading', params }, about);
  await moveToQuestion(talk, run, { readingId, state: 'which', sent });
  return { runId: run.id, isUsed: true };
}

async function answerNoRun(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial } = talk;
  if (trial === null) return { runId: null, isUsed: false };
  const caller = await findCaller(scope, trial);
  const about = { trialId: trial.id, because: text.id };
  await tell(scope, person.personId, { template: 'noRun', params: { caller: caller.name } }, about);
  return { runId: null, isUsed: false };
}

/** The right number of the two that were asked about: it counts, whatever stood before. */
export async function chooseReading(talk: Talk): Promise<TalkResult> {
  const { scope, conversation } = talk;
  const run = conversation.runId === null ? undefined : await findOwn(talk, conversation.runId);
  if (!run) return keepOpen(talk);
  const trial = await readRunningTrial(scope, run.trialId);
  const read = await readFor(talk, trial, run);
  if (read.values === undefined) return answerUnread(talk);
  return correctAndSay({ ...talk, reply: read }, trial, run);
}

/** A reading where a run's number was asked for: it is read as one of the run that is open. */
async function keepOpen(talk: Talk): Promise<TalkResult> {
  const { focus, trial, reply } = talk;
  if (focus === null || trial === null || reply.values === undefined) return answerUnread(talk);
  return keepReading(talk, trial, focus, { asksBack: false });
}

async function findOwn({ scope, person }: Talk, runId: string): Promise<Run | undefined> {
  return (await listClosedRunsOf(scope, person.personId)).find(
    ({ id, state }) => id === runId && state === 'done',
  );
}

/** FIX: other numbers for a run of this person, the last one unless another is named. */
export async function fixReading(talk: Talk): Promise<TalkResult> {
  const { scope, person, inHand, reply, text } = talk;
  const closed = (await listClosedRunsOf(scope, person.personId)).filter(({ state }) => state === 'done');
  const measured = inHand.filter(({ state }) => state === 'made' || state === 'doubtful');
  const own = [...closed, ...measured, ...inHand.filter(({ state }) => state === 'asked')];
  const first = own.find(({ number }) => number === reply.run) ?? own[0];
  if (!first) return answerNoRun(talk);
  const trial = await readRunningTrial(scope, first.trialId);
  const read = await readFor(talk, trial, first);
  const run = read.run === undefined ? first : own.find(({ number }) => number === read.run);
  if (!run) return answerNoRun(talk);
  if (read.values === undefined) {
    await askAgain(talk, trial, run, text.id);
    return { runId: run.id, isUsed: false };
  }
  const fixed = { ...talk, reply: read };
  if (run.state === 'done') return correctAndSay(fixed, trial, run);
  return keepReading(fixed, trial, run, { asksBack: false });
}

async function correctAndSay(talk: Talk, trial: RunningTrial, run: Run): Promise<TalkResult> {
  const { scope, person, text, reply, conversation } = talk;
  const figures = figuresOf(trial, reply.values);
  await correctReading(scope, { runId: run.id, figures, end: 'measured', ...submissionOf(talk) });
  const params = { what: 'saved', run: run.number, values: writeValues(figures) } as const;
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  await tell(scope, person.personId, { template: 'noted', params }, about);
  if (conversation.state === 'which') await returnToRun(talk);
  return { runId: run.id, isUsed: true };
}

/** A question is answered: the talk goes back to the run in hand, if there is one. */
async function returnToRun({ scope, person, focus }: Talk): Promise<void> {
  await talkOf(scope, person.personId, focus === null ? 'idle' : 'run', { runId: focus?.id ?? null });
}
