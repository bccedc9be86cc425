import type { AnswerOf, QuestionName } from '../answers.schema.ts';
import { questionNames } from '../answers.schema.ts';
import { untouched } from '../finished.schema.ts';
import { type ContentSource, createAnswerBook } from './answer-book.ts';
import type { AnswerKeep } from './kept-answers.ts';
import {
  isDue,
  meetKept,
  meetOtherTab,
  meetPresent,
  type QuestionState,
  takeOver,
} from './question-state.ts';
import {
  type SaveOutcome,
  type SaveRequest,
  type StoredAnswer,
  type StoredAnswers,
  sameContent,
  tidy,
} from './stored-answers.ts';

/** What the store leans on; the page gives the browser's, a test gives its own. */
export interface AnswersSurroundings {
  send(request: SaveRequest): Promise<SaveOutcome>;
  newSave(): string;
  keep: AnswerKeep;
  /** Tells the other tabs of this browser what was saved. */
  tell(question: QuestionName, stored: StoredAnswer): void;
  /** Calls back after so many milliseconds; answers how to call it off. */
  later(milliseconds: number, work: () => void): () => void;
  /** Calls back once the key that is being handled has been answered. */
  soon(work: () => void): void;
}

const pauseAfterTyping = 600;
/** A copy found in the browser may belong to a tab that is about to save it. */
const pauseAfterFinding = 1_500;
const retryPauses = [1_000, 2_000, 4_000, 8_000, 15_000, 30_000] as const;

export type AnswersStore = ReturnType<typeof createAnswersStore>;

/**
 * The answers of one trial on one page: what is typed is shown at once, kept in the browser at once, and saved a moment
 * later, one question at a time. Nothing typed is given up before the server has it or the reader says so.
 */
export function createAnswersStore(first: StoredAnswers) {
  const book = createAnswerBook(first);
  const { stateOf, put, show } = book;
  let around: AnswersSurroundings | null = null;
  let callOff: (() => void) | null = null;
  let failures = 0;
  let isSending = false;
  let sending = Promise.resolve();

  function sendLater(milliseconds: number): void {
    callOff?.();
    callOff = around?.later(milliseconds, () => void flush()) ?? null;
  }

  function requestOf(
    question: QuestionName,
    { content, stored, sent }: QuestionState,
    { newSave }: AnswersSurroundings,
  ): SaveRequest {
    const repeats = sent !== undefined && sameContent(sent.content, content);
    return { question, base: stored.version, content: tidy(content), save: repeats ? sent.save : newSave() };
  }

  function noteSent(question: QuestionName, { save, content }: SaveRequest): void {
    put(question, { ...stateOf(question), sent: { save, content } });
  }

  function settle({ question, content }: SaveRequest, outcome: SaveOutcome): void {
    const state = stateOf(question);
    book.noteTrouble(null);
    if (outcome.kind === 'saved') {
      const { version, savedAt } = outcome;
      const stored = { version, content, savedBy: null, savedAt };
      book.noteSaved(savedAt);
      put(question, { content: state.content, stored, typedHere: state.typedHere });
      around?.tell(question, stored);
    } else if (outcome.kind === 'changed meanwhile' && outcome.present.version !== state.stored.version) {
      put(question, meetPresent(state, outcome.present));
    } else if (outcome.kind === 'changed meanwhile') {
      // It refuses the very version it has: something is amiss over there, so it is asked again later.
      book.noteTrouble({ kind: 'offline' });
    } else {
      book.noteTrouble(outcome);
      if (outcome.kind === 'refused') put(question, { ...state, refused: content });
    }
  }

  /** @returns whether there may be more to send at once */
  async function sendNext(surroundings: AnswersSurroundings): Promise<boolean> {
    const due = book.entries().find(([, state]) => isDue(state));
    if (!due) return false;
    const request = requestOf(...due, surroundings);
    noteSent(request.question, request);
    settle(request, await surroundings.send(request));
    show();
    const trouble = book.troubleKind();
    if (trouble !== 'offline' && trouble !== 'signed out') {
      failures = 0;
      return true;
    }
    failures += 1;
    sendLater(retryPauses[Math.min(failures, retryPauses.length) - 1] ?? retryPauses[0]);
    return false;
  }

  async function sendAll(surroundings: AnswersSurroundings): Promise<void> {
    isSending = true;
    try {
      while (await sendNext(surroundings));
    } finally {
      isSending = false;
      show();
    }
  }

  /** Sends all that is unsaved now; settles when it is saved or could not be. */
  function flush(): Promise<void> {
    callOff?.();
    callOff = null;
    if (!around) return Promise.resolve();
    if (!isSending) sending = sendAll(around);
    return sending;
  }

  /** @returns whether it is anything new */
  function take(question: QuestionName, content: unknown, from: ContentSource): boolean {
    const { refused: _, ...rest } = stateOf(question);
    if (sameContent(rest.content, content)) return false;
    put(question, { ...rest, content, typedHere: true }, from);
    sendLater(pauseAfterTyping);
    return true;
  }

  return {
    /** Looks for copies of an earlier visit and begins to save. */
    start(surroundings: AnswersSurroundings): void {
      around = surroundings;
      book.keepIn(surroundings.keep);
      for (const [question, kept] of surroundings.keep.read()) {
        put(question, meetKept(stateOf(question).stored, kept));
      }
      if (book.hasDue()) sendLater(pauseAfterFinding);
      show();
    },
    stop(): void {
      callOff?.();
      around = null;
    },
    /** Takes over what was typed into the question's form. */
    change<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): void {
      if (take(question, content, 'its form')) show();
    },
    /** The same for a form that shows its fields by itself: the rest of the page follows after the key. */
    changeSoon<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): void {
      if (take(question, content, 'its form')) around?.soon(show);
    },
    /** The same from elsewhere than the question's own form, which then shows it: a starter, a copy. */
    fill<Name extends QuestionName>(question: Name, content: AnswerOf<Name> | undefined): void {
      if (take(question, content ?? untouched[question], 'elsewhere')) show();
    },
    flush,
    /** The requests to send while the page is being left, when nothing can be waited for. */
    leaving(): SaveRequest[] {
      const surroundings = around;
      if (!surroundings) return [];
      return book.entries().flatMap(([question, state]) => {
        if (!isDue(state)) return [];
        const request = requestOf(question, state, surroundings);
        // What is under way already with the same words needs no second request.
        if (isSending && request.save === state.sent?.save) return [];
        noteSent(question, request);
        return [request];
      });
    },
    /** What the server has now, asked for when the page comes back into view. */
    meet(present: StoredAnswers): void {
      for (const question of questionNames) {
        const stored = present[question];
        // An answer that was under way while something was saved may be older than what is here.
        const isNewer = stored && stored.version > stateOf(question).stored.version;
        if (isNewer) put(question, meetPresent(stateOf(question), stored));
      }
      show();
    },
    hearOtherTab(question: QuestionName, stored: StoredAnswer): void {
      put(question, meetOtherTab(stateOf(question), stored));
      book.noteSaved(stored.savedAt);
      show();
    },
    /** The reader looked at both texts. Theirs is put aside by a save on top of it, never unseen. */
    resolve(question: QuestionName, choice: 'mine' | 'theirs'): void {
      const { theirs, content } = stateOf(question);
      if (!theirs) return;
      put(question, choice === 'theirs' ? takeOver(theirs) : { content, stored: theirs, typedHere: true });
      sendLater(0);
      show();
    },
    contentOf: (question: QuestionName): unknown => stateOf(question).content,
    getSnapshot: book.getSnapshot,
    subscribe: book.subscribe,
    onReplaced: book.onReplaced,
  };
}
