import type { Reply } from '../../lib/messages/index.ts';
import { goOn } from './go-on.service.ts';
import type { Submission } from './keep-figures.service.ts';
import { recordRun } from './record-run.service.ts';
import type { Run } from './run.ts';
import { askFor, writeValues } from './run-words.ts';
import type { RunningTrial } from './running-trial.ts';
import { type Talk, type TalkResult, writeSent } from './talk.service.ts';
import { askIfQuick, askWhichRun, doubtAsSetting, moveToQuestion } from './talk-questions.service.ts';
import { takeStray } from './talk-stray.service.ts';
import { answerUnread } from './talk-unread.service.ts';
import { talkOf, tell } from './tell.service.ts';
import { countingFigures, figuresOf, looksOdd, missingItems } from './text-figures.service.ts';

export function submissionOf({ person, text }: Talk): Submission {
  return { submission: text.id, source: 'text', enteredBy: person.personId, inboxTextId: text.id };
}

/** A reading of an open run: kept, asked back, or asked which run it is for. */
export async function takeReading(talk: Talk): Promise<TalkResult> {
  const { reply, inHand, trial } = talk;
  if (reply.run !== undefined && !inHand.some(({ number }) => number === reply.run)) return takeStray(talk);
  if (trial === null) return takeStray(talk);
  if (reply.ask === 'howMany' || reply.ask === 'whichNumber') return answerUnread(talk);
  if (reply.ask === 'whichRun') return askWhichRun(talk, trial);
  const { focus } = talk;
  if (focus === null) return takeStray(talk);
  if (reply.ask === 'sameAsSetting') return doubtAsSetting(talk, trial, focus);
  const asked = await askIfQuick(talk, trial, focus);
  return asked ?? keepReading(talk, trial, focus, { asksBack: true });
}

/**
 * Keeps the numbers of a text and says what comes next.
 * @param options.asksBack whether numbers far from anything plausible are asked back first: once, and never again
 */
export async function keepReading(
  talk: Talk,
  trial: RunningTrial,
  run: Run,
  options: { asksBack: boolean; values?: Reply['values'] },
): Promise<TalkResult> {
  const { scope, person, text } = talk;
  const values = options.values ?? talk.reply.values;
  const figures = figuresOf(trial, values);
  const isDoubted = options.asksBack && run.state !== 'doubtful' && (await looksOdd(scope, trial, figures));
  const wish = { runId: run.id, figures, end: 'measured', isDoubted, ...submissionOf(talk) } as const;
  const { already } = await recordRun(scope, wish);
  if (already) return { runId: run.id, isUsed: true };
  if (isDoubted) {
    const params = { run: run.number, values: writeSent(values) };
    const about = { trialId: trial.id, runId: run.id, because: text.id };
    const sent = await tell(scope, person.personId, { template: 'odd', params }, about);
    await moveToQuestion(talk, run, { state: 'sure', sent });
  } else {
    await sayKept(talk, trial, run);
  }
  return { runId: run.id, isUsed: true };
}

/** Asks for the result that is still missing, or lets the trial go on. */
export async function sayKept({ scope, person, text }: Talk, trial: RunningTrial, run: Run): Promise<void> {
  const [next] = await missingItems(scope, trial, run.id);
  if (next === undefined) {
    const values = writeValues(await countingFigures(scope, run.id));
    const lead = { what: 'saved', run: run.number, values } as const;
    return goOn(scope, { trialId: trial.id, runId: run.id, lead, from: person.personId, because: text.id });
  }
  const about = { trialId: trial.id, runId: run.id, because: text.id };
  const params = { run: run.number, ask: askFor(next) };
  const sent = await tell(scope, person.personId, { template: 'nextResult', params }, about);
  const promptMessageId = sent.queued ? sent.id : null;
  await talkOf(scope, person.personId, 'results', { runId: run.id, promptMessageId });
}
