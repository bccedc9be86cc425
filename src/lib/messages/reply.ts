import type { TextLanguage } from './plain-letter-tables.ts';

/** One result that is asked for, in the order it is asked. */
export interface ExpectedItem {
  key: string;
  kind: 'measured' | 'rejects' | 'flaws';
  /** How many numbers it takes; rejects take one count. */
  readings: number;
  /** Parts looked at, where rejects are counted. */
  lotSize?: number;
  /** What a person may call it: its name, its unit. */
  names?: readonly string[];
}

/** What a phone has been asked: the meaning of a reply hangs on it. */
export interface ReplyExpectation {
  items: readonly ExpectedItem[];
  openRuns: readonly { run: number; state: 'make' | 'measure' }[];
  /** The settings of the run to make, as the panel names them. */
  settings: readonly { name: string; value: number | string }[];
  /** Lowest and highest value of a result that would surprise nobody, by its key. */
  plausible?: Readonly<Record<string, readonly [number, number]>>;
  /** The person's language: decides the few words that mean different things in two languages. */
  language?: TextLanguage;
}

export const replyIntents = [
  'reading',
  'done',
  'fix',
  'cannot',
  'newBatch',
  'danger',
  'help',
  'skip',
  'later',
  'problem',
  'yes',
  'no',
  'stop',
  'start',
  'link',
  'unreadable',
] as const;
export type ReplyIntent = (typeof replyIntents)[number];

export interface Reply {
  intent: ReplyIntent;
  /** The run it belongs to: named in the text, or the only one it can be. */
  run?: number;
  /** Numbers by the key of their result; rejects as `[count]` or `[count, lot]`. */
  values?: Record<string, number[]>;
  /** How long LATER is. */
  minutes?: number;
  /** How far a setting that cannot be reached got, the value as it was typed. */
  actual?: { name: string; value: string };
  /** What stands behind PROBLEM, NEW BATCH or CANT, as it was typed. */
  words?: string;
  /** What must be asked back before the reply counts. */
  ask?: 'whichRun' | 'howMany' | 'whichNumber' | 'sameAsSetting';
}
