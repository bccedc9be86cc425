import type { KeptAnswer } from './kept-answers.ts';
import { type StoredAnswer, sameContent } from './stored-answers.ts';

/** One question on this page, against what the server is known to have. */
export interface QuestionState {
  content: unknown;
  /** What the server last confirmed. */
  stored: StoredAnswer;
  /** Typed on this page, in contrast to taken over from a copy that another tab may be typing on. */
  typedHere: boolean;
  /** The last save that was sent and not answered. */
  sent?: { save: string; content: unknown } | undefined;
  theirs?: StoredAnswer | undefined;
  /** The content that the server refused: not sent again until it changes. */
  refused?: unknown;
}

export const neverSaved: StoredAnswer = { version: 0, content: undefined, savedBy: null, savedAt: null };

export function isUnsaved(state: QuestionState): boolean {
  return !sameContent(state.content, state.stored.content);
}

/** Whether it may be sent now: unsaved, nobody else in between, and not refused as it stands. */
export function isDue(state: QuestionState): boolean {
  const isRefused = state.refused !== undefined && sameContent(state.refused, state.content);
  return isUnsaved(state) && !state.theirs && !isRefused;
}

/** Takes what the server has now. Whoever typed something else meanwhile has both. */
export function meetPresent(state: QuestionState, present: StoredAnswer): QuestionState {
  if (present.version === state.stored.version) return state;
  if (!isUnsaved(state) || sameContent(state.content, present.content)) return takeOver(present);
  // Our own save arrived and its answer was lost: what was typed since follows it.
  const isOurs = state.sent !== undefined && sameContent(state.sent.content, present.content);
  if (isOurs) return { content: state.content, stored: present, typedHere: state.typedHere };
  return { ...state, theirs: present };
}

/** Takes what another tab of this browser has saved. A copy that was only taken over gives way to it. */
export function meetOtherTab(state: QuestionState, present: StoredAnswer): QuestionState {
  if (present.version <= state.stored.version) return state;
  return state.typedHere ? meetPresent(state, present) : takeOver(present);
}

/** A copy kept by an earlier visit, met with what the server has now. */
export function meetKept(stored: StoredAnswer, kept: KeptAnswer): QuestionState {
  const { content, sent, base } = kept;
  if (stored.version <= base) return { content, stored, sent, typedHere: false };
  return meetPresent({ content, stored: { ...neverSaved, version: base }, sent, typedHere: false }, stored);
}

export function takeOver(present: StoredAnswer): QuestionState {
  return { content: present.content, stored: present, typedHere: false };
}
