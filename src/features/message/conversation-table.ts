import type { ReplyIntent } from '../../lib/messages/index.ts';
import type { ConversationState } from './text-reading.ts';

/** What is done with a text, once it is known what it says and where the talk with that phone stands. */
export const conversationActions = [
  /** The end of texts; an open run is held and tops the board. */
  'optOut',
  /** The number lets texts in again: it may be asked once more. */
  'letIn',
  'agree',
  'decline',
  'endPractice',
  /** A reading of an open run. */
  'record',
  /** A reading while nothing is open: a second one for the last run, or late. */
  'stray',
  /** A reading where a doubtful one was asked back: it stands instead. */
  'replace',
  /** A reading where two were asked about: the one that is right. */
  'choose',
  'make',
  /** The usual settings are back. */
  'backToUsual',
  'fix',
  'cannot',
  'newBatch',
  'hold',
  'help',
  'skip',
  'later',
  'problem',
  'confirm',
  'deny',
  /** Ready for the next run. */
  'goOn',
  'link',
  'unread',
  /** Needs no answer: "ok" to a run, "no" to nothing. It stands in the talk all the same. */
  'keep',
  /** Nothing that this phone may ask for: kept, and never answered. */
  'setAside',
] as const;
export type ConversationAction = (typeof conversationActions)[number];
type Row = Readonly<Record<ReplyIntent, ConversationAction>>;

/** Somebody who has not said yes to texts. Danger counts from anybody. */
const silent: Row = {
  reading: 'setAside',
  done: 'setAside',
  fix: 'setAside',
  cannot: 'setAside',
  newBatch: 'setAside',
  danger: 'hold',
  help: 'setAside',
  skip: 'setAside',
  later: 'setAside',
  problem: 'setAside',
  yes: 'setAside',
  no: 'setAside',
  stop: 'optOut',
  start: 'letIn',
  link: 'setAside',
  unreadable: 'setAside',
};

const idle: Row = {
  reading: 'stray',
  done: 'backToUsual',
  fix: 'fix',
  cannot: 'unread',
  newBatch: 'newBatch',
  danger: 'hold',
  help: 'help',
  skip: 'unread',
  later: 'unread',
  problem: 'problem',
  yes: 'goOn',
  no: 'keep',
  stop: 'optOut',
  start: 'keep',
  link: 'link',
  unreadable: 'unread',
};

const run: Row = {
  ...idle,
  reading: 'record',
  done: 'make',
  cannot: 'cannot',
  skip: 'skip',
  later: 'later',
  yes: 'keep',
  no: 'unread',
};

/** What each intent does in each state of the talk with one phone. Every pair has its entry; a test insists. */
export const conversationTable: Readonly<Record<ConversationState, Row>> = {
  unasked: silent,
  asked: { ...silent, yes: 'agree', no: 'decline' },
  practice: { ...idle, reading: 'endPractice', done: 'keep', fix: 'unread', yes: 'keep' },
  idle,
  run,
  results: run,
  sure: { ...run, reading: 'replace', yes: 'confirm', no: 'deny' },
  which: { ...run, reading: 'choose' },
  left: { ...silent, start: 'letIn' },
};
