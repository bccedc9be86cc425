import type { Answers, QuestionName } from '../answers.schema.ts';

/** One question as the server has it. */
export interface StoredAnswer {
  /** Counts the saves of this question; 0 while it was never saved. */
  version: number;
  content: unknown;
  /** The name of whoever saved it, null where nobody is known. */
  savedBy: string | null;
  savedAt: number | null;
}

export type StoredAnswers = { readonly [Name in QuestionName]?: StoredAnswer | undefined };

/** One save of one question. A repeat carries the same `save`, so that it counts once. */
export interface SaveRequest {
  question: QuestionName;
  /** The version that was changed. */
  base: number;
  content: unknown;
  save: string;
}

export type SaveOutcome =
  | { kind: 'saved'; version: number; savedAt: number }
  | { kind: 'changed meanwhile'; present: StoredAnswer }
  | { kind: 'offline' }
  | { kind: 'signed out' }
  /** The server's sentence; the same content would be refused again. */
  | { kind: 'refused'; sentence: string };

/** What the head of the page says about saving. */
export type SaveState =
  | { kind: 'saved'; at: number | null }
  | { kind: 'saving' }
  /** The reader has two texts to choose from. */
  | { kind: 'undecided' }
  | { kind: 'offline' }
  | { kind: 'signed out' }
  | { kind: 'refused'; sentence: string };

/** Somebody else saved the same question; both texts are kept until the reader decides. */
export interface AnswerConflict {
  question: QuestionName;
  mine: unknown;
  theirs: StoredAnswer;
}

/** All that a page shows of the answers; a new object after each change. */
export interface AnswersSnapshot {
  answers: Answers;
  save: SaveState;
  conflicts: readonly AnswerConflict[];
}

/** Whether two typed answers say the same. An empty field is the same as one never touched. */
export function sameContent(first: unknown, second: unknown): boolean {
  return JSON.stringify(tidy(first ?? {})) === JSON.stringify(tidy(second ?? {}));
}

/** An answer without its empty fields, keys in order: what is kept and sent. */
export function tidy(content: unknown): unknown {
  if (Array.isArray(content)) return content.map((item) => tidy(item ?? {}));
  if (typeof content !== 'object' || content === null) return content;
  const entries = Object.entries(content)
    .filter(([, value]) => value !== undefined && value !== null && value !== '' && value !== false)
    .map(([name, value]) => [name, tidy(value)] as const);
  return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)));
}
