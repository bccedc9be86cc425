import { type ReplyExpectation, readReply } from '../../lib/messages/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { FullAddressee } from '../message/addressee.repository.ts';
import { type Conversation, readConversation } from '../message/conversation.repository.ts';
import { type ConversationAction, conversationTable } from '../message/conversation-table.ts';
import type { InboxText } from '../message/inbox.repository.ts';
import type { ConversationState } from '../message/text-reading.ts';
import { holdByText } from './hold-by-text.service.ts';
import { takeInitials } from './line-phone.service.ts';
import type { Run } from './run.ts';
import { crewOf } from './run-people.service.ts';
import { readRunningTrial } from './running-trial.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { listClosedRunsOf, listRunsInHand } from './runs-in-hand.repository.ts';
import { listTrialsAtMachine } from './set-back.repository.ts';
import { expectationOf, type Talk, type TalkResult } from './talk.service.ts';
import { hasPictures, takePicture } from './talk-picture.service.ts';
import { acceptReading, chooseRun, denyReading } from './talk-questions.service.ts';
import { keepReading, takeReading } from './talk-reading.service.ts';
import {
  answerHelp,
  goOnByText,
  madeByText,
  noteUsualSettings,
  putOffRun,
  reportBatch,
  reportProblem,
  reportSetting,
  sendPhoneLink,
  skipByText,
} from './talk-report.service.ts';
import { chooseReading, fixReading, takeStray } from './talk-stray.service.ts';
import { answerUnread } from './talk-unread.service.ts';
import { missingItems, plausibleRanges } from './text-figures.service.ts';

const keep = async ({ focus }: Talk): Promise<TalkResult> => ({ runId: focus?.id ?? null, isUsed: true });
const setAside = async (): Promise<TalkResult> => ({ runId: null, isUsed: false });

/** What carries out each action. Consent and practice are read before any run is spoken of, so they end here. */
const handlers: Readonly<Record<ConversationAction, (talk: Talk) => Promise<TalkResult>>> = {
  optOut: setAside,
  letIn: setAside,
  agree: setAside,
  decline: setAside,
  endPractice: keep,
  record: takeReading,
  stray: takeStray,
  replace: replaceReading,
  choose: chooseReading,
  make: madeByText,
  backToUsual: noteUsualSettings,
  fix: fixReading,
  cannot: reportSetting,
  newBatch: reportBatch,
  hold: holdByText,
  help: answerHelp,
  skip: skipByText,
  later: putOffRun,
  problem: reportProblem,
  confirm: acceptReading,
  deny: denyReading,
  goOn: goOnByText,
  link: sendPhoneLink,
  unread: answerUnread,
  keep,
  setAside,
};

/** Another number in the place of one that was asked back: it counts, and is not asked back a second time. */
function replaceReading(talk: Talk): Promise<TalkResult> {
  const { reply, focus, trial, conversation } = talk;
  const isAbout = focus !== null && focus.id === conversation.runId;
  if (!isAbout || trial === null || reply.values === undefined) return takeReading(talk);
  if (reply.run !== undefined && reply.run !== focus.number) return takeReading(talk);
  return keepReading(talk, trial, focus, { asksBack: false });
}

/**
 * What a text does, once consent and practice are settled: read by what the phone was asked, then carried out by the
 * conversation table. Call it in the transaction that takes the text off the pile.
 */
export async function converse(
  scope: ShopScope,
  person: FullAddressee,
  text: InboxText,
): Promise<TalkResult & { intent: string }> {
  const conversation = await readConversation(scope, person.personId);
  const inHand = await listRunsInHand(scope, person.personId);
  const focus = focusOf(conversation, inHand);
  const trial = await trialOf(scope, person, focus);
  const talk: Talk = {
    scope,
    person,
    text,
    conversation,
    inHand,
    focus,
    trial,
    reply: { intent: 'unreadable' },
  };
  if (text.body.trim() === '' && hasPictures(text)) return { ...(await takePicture(talk)), intent: 'photo' };
  const chosen = await chooseRun(talk);
  if (chosen) return { ...chosen, intent: 'reading' };

  const read = await readWith(talk);
  const action = conversationTable[stateOf(conversation, person, inHand)][read.reply.intent];
  const signed = read.reply.intent === 'unreadable' ? await takeInitials(read) : undefined;
  if (signed) return { ...signed, intent: 'initials' };
  const result = await handlers[action](read);
  return { ...result, intent: read.reply.intent };
}

/** The run that a reply without a number belongs to: the one to make, else the one spoken of, else the only one. */
function focusOf(conversation: Conversation, inHand: readonly Run[]): Run | null {
  const spoken = inHand.find(({ id }) => id === conversation.runId);
  if (spoken && ['sure', 'results'].includes(conversation.state)) return spoken;
  const toMake = inHand.find(({ state }) => state === 'asked');
  return toMake ?? spoken ?? (inHand.length === 1 ? (inHand[0] ?? null) : null);
}

const beforeAnyRun: readonly ConversationState[] = ['unasked', 'asked', 'practice', 'idle'];

/**
 * The board may have closed what a phone was asked, a lab may owe numbers it was never asked for, and consent may have
 * been given on paper.
 */
function stateOf(
  { state }: Conversation,
  { consent, isSuppressed }: FullAddressee,
  inHand: readonly Run[],
): ConversationState {
  if (consent !== 'agreed' || isSuppressed) return state;
  if (beforeAnyRun.includes(state)) {
    if (inHand.length > 0) return 'run';
    return state === 'practice' ? 'practice' : 'idle';
  }
  const isAboutRun = state === 'run' || state === 'results' || state === 'sure';
  return isAboutRun && inHand.length === 0 ? 'idle' : state;
}

async function trialOf(
  scope: ShopScope,
  person: FullAddressee,
  focus: Run | null,
): Promise<RunningTrial | null> {
  if (focus) return readRunningTrial(scope, focus.trialId);
  const [last] = await listClosedRunsOf(scope, person.personId);
  const ids = await listTrialsAtMachine(scope);
  const own = last && ids.includes(last.trialId) ? [last.trialId, ...ids] : ids;
  for (const id of own) {
    const trial = await readRunningTrial(scope, id);
    if (id === last?.trialId || crewOf(trial).includes(person.personId)) return trial;
  }
  return null;
}

/** Reads the text for the run in hand; where it names another one, for that. */
async function readWith(talk: Talk): Promise<Talk> {
  const first = await readFor(talk, talk.focus ?? talk.inHand[0] ?? null);
  const named = talk.inHand.find(({ number }) => number === first.reply.run);
  if (!named || named.id === first.focus?.id) return first;
  return readFor(talk, named, named);
}

async function readFor(talk: Talk, run: Run | null, focus: Run | null = talk.focus): Promise<Talk> {
  const { scope, person, text, inHand, conversation } = talk;
  const closed = run === null ? (await listClosedRunsOf(scope, person.personId))[0] : undefined;
  const about = run ?? closed;
  if (!about) {
    const nothing: ReplyExpectation = { items: [], openRuns: [], settings: [], language: person.language };
    return { ...talk, reply: readReply(text.body, nothing) };
  }
  const trial = await readRunningTrial(scope, about.trialId);
  const missing = await missingItems(scope, trial, about.id);
  const items = missing.length > 0 && about.state !== 'done' ? missing : trial.items;
  const ranges = await plausibleRanges(scope, trial);
  const isOpen = run !== null;
  const expectation = expectationOf(trial, {
    run: about,
    items,
    inHand: isOpen ? inHand : [],
    ranges,
    language: person.language,
  });
  const reply = readReply(text.body, expectation);
  // While a question about one run is open, a number answers it, whatever else waits.
  const isAnswer = conversation.state === 'sure' && reply.ask === 'whichRun' && focus !== null;
  const answered = isAnswer
    ? { intent: reply.intent, run: focus.number, ...(reply.values ? { values: reply.values } : {}) }
    : reply;
  return { ...talk, focus, trial: isOpen ? trial : talk.trial, reply: answered };
}
