import { now } from '../../server/clock.ts';
import { newId } from '../../server/ids.ts';
import { hadMessage } from '../message/message.repository.ts';
import { makePhoneLink } from '../phone/phone-link.service.ts';
import { askNextRun } from './ask-next.service.ts';
import { confirmSetBack } from './back-to-usual.service.ts';
import { remindLater, reportCannotReach } from './cannot-reach.service.ts';
import { beginStretch } from './change-stretch.service.ts';
import { goOn } from './go-on.service.ts';
import { makeRun } from './make-run.service.ts';
import { raiseProblem } from './problem.service.ts';
import { updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import { findCaller } from './run-people.service.ts';
import { isBeingRun } from './run-reader.service.ts';
import { askFor, settingsOfRun, writeFigure } from './run-words.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { listTrialsAtMachine, readSetBack } from './set-back.repository.ts';
import { skipRun } from './skip-run.service.ts';
import { findStretch } from './stretch.repository.ts';
import type { Talk, TalkResult } from './talk.service.ts';
import { answerUnread, nextItem } from './talk-unread.service.ts';
import { talkOf, tell } from './tell.service.ts';

const minute = 60_000;

/** The run a report is about: the one that is named, if this phone has it, else the one in hand. */
function runOf({ reply, inHand, focus }: Talk): Run | null {
  if (reply.run === undefined) return focus;
  return inHand.find(({ number }) => number === reply.run) ?? null;
}

const aboutOf = ({ text }: Talk, run: Run | null, trialId: string) => ({
  trialId,
  because: text.id,
  ...(run === null ? {} : { runId: run.id }),
});

/** DONE: the parts are made. Their numbers are asked for, of whoever measures; the trial goes on. */
export async function madeByText(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial } = talk;
  const run = runOf(talk);
  if (run === null || trial === null) return answerUnread(talk);
  const isNews = run.state === 'asked' && run.madeAt === null;
  if (isNews) await makeRun(scope, { runId: run.id });
  if (trial.resultsLater && isNews) {
    const lead = { what: 'made', run: run.number } as const;
    await goOn(scope, { trialId: trial.id, runId: run.id, lead, from: person.personId, because: text.id });
    return { runId: run.id, isUsed: true };
  }
  const params = { run: run.number, ask: askFor(await nextItem(scope, trial, run)) };
  const about = aboutOf(talk, run, trial.id);
  const sent = await tell(scope, person.personId, { template: 'nextResult', params }, about);
  const promptMessageId = sent.queued ? sent.id : null;
  await talkOf(scope, person.personId, 'results', { runId: run.id, promptMessageId });
  return { runId: run.id, isUsed: true };
}

/** SKIP: no reason is asked for. */
export async function skipByText(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial } = talk;
  const run = runOf(talk);
  if (run === null || trial === null) return answerUnread(talk);
  await skipRun(scope, { runId: run.id });
  const lead = { what: 'skipped', run: run.number } as const;
  await goOn(scope, { trialId: trial.id, runId: run.id, lead, from: person.personId, because: text.id });
  return { runId: run.id, isUsed: true };
}

/** LATER: the reminder moves. */
export async function putOffRun(talk: Talk): Promise<TalkResult> {
  const { scope, person, trial, reply } = talk;
  const run = runOf(talk);
  if (run === null || trial === null || run.state === 'doubtful') return answerUnread(talk);
  const minutes = Math.min(reply.minutes ?? trial.remindMinutes, 24 * 60);
  await remindLater(scope, run, now() + minutes * minute);
  const params = { run: run.number, minutes };
  await tell(scope, person.personId, { template: 'later', params }, aboutOf(talk, run, trial.id));
  return { runId: run.id, isUsed: true };
}

/** CANT: a setting cannot be reached. The run stays, and whoever is called decides what to do with it. */
export async function reportSetting(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial, reply } = talk;
  const run = runOf(talk);
  if (run === null || trial === null) return answerUnread(talk);
  const about = aboutOf(talk, run, trial.id);
  const caller = await findCaller(scope, trial);
  if (reply.actual === undefined) {
    const [setting] = settingsOfRun(trial, run);
    const example = `${setting?.name ?? ''} ${writeFigure(setting?.value ?? '')}`;
    await tell(
      scope,
      person.personId,
      { template: 'cannotAsk', params: { example, caller: caller.name } },
      about,
    );
    return { runId: run.id, isUsed: true };
  }
  const actual = `${reply.actual.name} ${reply.actual.value}`;
  const said = { id: newId(), words: text.body.trim(), actual, by: person };
  await reportCannotReach(scope, { trial, run }, said);
  await tell(
    scope,
    person.personId,
    { template: 'cannotNoted', params: { actual, caller: caller.name } },
    about,
  );
  return { runId: run.id, isUsed: true };
}

/** PROBLEM: no runs go out until somebody has dealt with it. */
export async function reportProblem(talk: Talk): Promise<TalkResult> {
  const { scope, person, trial, reply } = talk;
  const run = runOf(talk);
  if (trial === null || !isBeingRun(trial)) return answerUnread(talk);
  if (run !== null) await remindLater(scope, run, null);
  const raisedBy = person.personId;
  const problem = {
    id: newId(),
    trialId: trial.id,
    runId: run?.id ?? null,
    words: reply.words ?? '',
    raisedBy,
  };
  await raiseProblem(scope, problem);
  const { name: caller } = await findCaller(scope, trial);
  await tell(
    scope,
    person.personId,
    { template: 'problemNoted', params: { caller } },
    aboutOf(talk, run, trial.id),
  );
  return { runId: run?.id ?? null, isUsed: true };
}

/** NEW BATCH: what is made from now on belongs to a stretch of its own. */
export async function reportBatch(talk: Talk): Promise<TalkResult> {
  const { scope, person, trial, reply, focus } = talk;
  if (trial === null) return answerUnread(talk);
  const about = aboutOf(talk, focus, trial.id);
  if (reply.words === undefined) {
    await tell(scope, person.personId, { template: 'batchAsk', params: {} }, about);
    return { runId: focus?.id ?? null, isUsed: true };
  }
  await beginStretch(scope, trial.id, { kind: 'new batch', words: reply.words });
  // The run in hand is made from the new batch.
  if (focus?.state === 'asked') {
    const stretchId = await findStretch(scope, trial.id);
    await updateRun(scope, { id: focus.id, from: ['asked'] }, { stretchId });
  }
  await tell(scope, person.personId, { template: 'batchNoted', params: { batch: reply.words } }, about);
  return { runId: focus?.id ?? null, isUsed: true };
}

/** ?: what may be texted now. */
export async function answerHelp(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial, focus } = talk;
  if (trial === null || focus === null) {
    const about = { because: text.id, ...(trial === null ? {} : { trialId: trial.id }) };
    await tell(scope, person.personId, { template: 'helpIdle', params: {} }, about);
    return { runId: null, isUsed: true };
  }
  const { name: caller } = await findCaller(scope, trial);
  const params = { run: focus.number, ask: askFor(await nextItem(scope, trial, focus)), caller };
  await tell(scope, person.personId, { template: 'helpRun', params }, aboutOf(talk, focus, trial.id));
  return { runId: focus.id, isUsed: true };
}

/** LINK: the phone page, for this person alone and this trial. */
export async function sendPhoneLink(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, trial, focus } = talk;
  if (trial === null) return answerUnread(talk);
  const link = await makePhoneLink(scope, { personId: person.personId, trialId: trial.id });
  const about = { trialId: trial.id, because: text.id };
  await tell(scope, person.personId, { template: 'phoneLink', params: { link } }, about);
  return { runId: focus?.id ?? null, isUsed: true };
}

/** DONE with nothing open: the usual settings are back, where somebody was asked for that. */
export async function noteUsualSettings(talk: Talk): Promise<TalkResult> {
  const { scope, person, text } = talk;
  for (const trialId of await listTrialsAtMachine(scope)) {
    const trial = await readRunningTrial(scope, trialId);
    if ((await readSetBack(scope, trialId)) !== 'asked') continue;
    const templates = ['stopped', 'backToUsual', 'endedEarly'];
    if (!(await hadMessage(scope, { templates, trialId, personId: person.personId }))) continue;
    await confirmSetBack(scope, trialId);
    await tell(
      scope,
      person.personId,
      { template: 'backDone', params: { machine: trial.machine } },
      { trialId, because: text.id },
    );
    return { runId: null, isUsed: true };
  }
  return answerUnread(talk);
}

/** GO: the next run, where the crew sets the pace. */
export async function goOnByText(talk: Talk): Promise<TalkResult> {
  const { scope, trial } = talk;
  if (trial === null || trial.pace.next !== 'go') return { runId: null, isUsed: false };
  const asked = await askNextRun(scope, trial, { isWished: true });
  return { runId: asked?.run.id ?? null, isUsed: asked !== undefined };
}
