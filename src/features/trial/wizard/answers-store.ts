import { type AnswerOf, type Answers, type QuestionName, questionNames } from '../answers.schema.ts';
import { untouched } from '../finished.schema.ts';
import type { AnswerKeep } from './kept-answers.ts';
import {
  isDue,
  isUnsaved,
  meetKept,
  meetOtherTab,
  meetPresent,
  neverSaved,
  type QuestionState,
  takeOver,
} from './question-state.ts';
import {
  type AnswersSnapshot,
  type SaveOutcome,
  type SaveRequest,
  type SaveState,
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
}

const pauseAfterTyping = 600;
/** A copy found in the browser may belong to a tab that is about to save it. */
const pauseAfterFinding = 1_500;
const retryPauses = [1_000, 2_000, 4_000, 8_000, 15_000, 30_000];

type AnswersStore = ReturnType<typeof createAnswersStore>;

export type { AnswersStore };

/**
 * The answers of one trial on one page: what is typed is shown at once, kept in the browser at once, and saved a moment
 * later, one question at a time. Nothing typed is given up before the server has it or the reader says so.
 */
export function createAnswersStore(first: StoredAnswers) {
  const states = new Map<QuestionName, QuestionState>();
  for (const name of questionNames) {
    const stored = first[name];
    if (stored) states.set(name, takeOver(stored));
  }
  const readers = new Set<() => void>();
  const replacedReaders = new Set<(question: QuestionName) => void>();
  let around: AnswersSurroundings | null = null;
  let callOff: (() => void) | null = null;
  let failures = 0;
  let trouble: SaveState | null = null;
  let sending: Promise<void> | null = null;
  let lastSavedAt = Math.max(0, ...[...states.values()].map(({ stored }) => stored.savedAt ?? 0)) || null;
  let snapshot = takeSnapshot();

  function stateOf(question: QuestionName): QuestionState {
    return states.get(question) ?? takeOver(neverSaved);
  }

  function sayHow(): SaveState {
    if ([...states.values()].some(isDue)) return trouble ?? { kind: 'saving' };
    return trouble?.kind === 'refused' || trouble?.kind === 'signed out'
      ? trouble
      : { kind: 'saved', at: lastSavedAt };
  }

  function takeSnapshot(): AnswersSnapshot {
    const pairs = [...states].filter(([, { content }]) => content !== undefined);
    return {
      answers: Object.fromEntries(pairs.map(([name, { content }]) => [name, content])) as Answers,
      save: sayHow(),
      conflicts: [...states].flatMap(([question, { content, theirs }]) =>
        theirs ? [{ question, mine: content, theirs }] : [],
      ),
    };
  }

  function show(): void {
    snapshot = takeSnapshot();
    for (const read of readers) read();
  }

  /** Puts a question's new state in place, in the browser's copy too. */
  function put(
    question: QuestionName,
    next: QuestionState,
    from: 'its form' | 'elsewhere' = 'elsewhere',
  ): void {
    const before = stateOf(question);
    states.set(question, next);
    if (!isUnsaved(next)) around?.keep.remove(question);
    else {
      const { content, stored, sent } = next;
      around?.keep.write(question, { base: stored.version, content, ...(sent ? { sent } : {}) });
    }
    const isNews = from === 'elsewhere' && !sameContent(before.content, next.content);
    if (isNews) for (const hear of replacedReaders) hear(question);
  }

  function sendLater(milliseconds: number): void {
    callOff?.();
    callOff = around?.later(milliseconds, () => void flush()) ?? null;
  }

  function settle(question: QuestionName, request: SaveRequest, outcome: SaveOutcome): void {
    const state = stateOf(question);
    trouble = null;
    if (outcome.kind === 'saved') {
      const { version, savedAt } = outcome;
      const stored = { version, content: request.content, savedBy: null, savedAt };
      lastSavedAt = savedAt;
      put(question, { content: state.content, stored, typedHere: state.typedHere });
      around?.tell(question, stored);
    } else if (outcome.kind === 'changed meanwhile' && outcome.present.version !== state.stored.version) {
      put(question, meetPresent(state, outcome.present));
    } else if (outcome.kind === 'changed meanwhile') {
      // It refuses the very version it has: something is amiss over there, so it is asked again later.
      trouble = { kind: 'offline' };
    } else {
      trouble = outcome;
      if (outcome.kind === 'refused') put(question, { ...state, refused: request.content });
    }
  }

  async function sendAll(surroundings: AnswersSurroundings): Promise<void> {
    for (;;) {
      const due = [...states].find(([, state]) => isDue(state));
      if (!due) break;
      const [question, state] = due;
      const request = requestOf(question, state, surroundings);
      states.set(question, { ...state, sent: { save: request.save, content: request.content } });
      settle(question, request, await surroundings.send(request));
      if (trouble?.kind === 'offline' || trouble?.kind === 'signed out') {
        failures += 1;
        sendLater(retryPauses[Math.min(failures, retryPauses.length) - 1] ?? 30_000);
        break;
      }
      failures = 0;
      show();
    }
    show();
  }

  function requestOf(
    question: QuestionName,
    { content, stored, sent }: QuestionState,
    { newSave }: AnswersSurroundings,
  ): SaveRequest {
    const repeats = sent !== undefined && sameContent(sent.content, content);
    return { question, base: stored.version, content: tidy(content), save: repeats ? sent.save : newSave() };
  }

  /** Sends all that is unsaved now; settles when it is saved or could not be. */
  function flush(): Promise<void> {
    callOff?.();
    callOff = null;
    if (!around) return Promise.resolve();
    sending ??= sendAll(around).finally(() => {
      sending = null;
    });
    return sending;
  }

  return {
    /** Looks for copies of an earlier visit and begins to save. */
    start(surroundings: AnswersSurroundings): void {
      around = surroundings;
      for (const [question, kept] of surroundings.keep.read()) {
        put(question, meetKept(stateOf(question).stored, kept));
      }
      if ([...states.values()].some(isDue)) sendLater(pauseAfterFinding);
      show();
    },
    stop(): void {
      callOff?.();
      around = null;
    },
    change<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): void {
      const state = stateOf(question);
      if (sameContent(state.content, content)) return;
      const { refused: _, ...rest } = state;
      put(question, { ...rest, content, typedHere: true }, 'its form');
      sendLater(pauseAfterTyping);
      show();
    },
    /** The same from elsewhere than the question's own form, which then shows it: a starter, a copy. */
    fill<Name extends QuestionName>(question: Name, content: AnswerOf<Name> | undefined): void {
      const { refused: _, ...rest } = stateOf(question);
      put(question, { ...rest, content: content ?? untouched[question], typedHere: true });
      sendLater(pauseAfterTyping);
      show();
    },
    flush,
    /** The requests to send while the page is being left, when nothing can be waited for. */
    leaving(): SaveRequest[] {
      const surroundings = around;
      if (!surroundings) return [];
      return [...states].flatMap(([question, state]) => {
        if (!isDue(state)) return [];
        const request = requestOf(question, state, surroundings);
        // What is under way already with the same words needs no second request.
        if (sending && request.save === state.sent?.save) return [];
        put(question, { ...state, sent: { save: request.save, content: request.content } });
        return [request];
      });
    },
    /** What the server has now, asked for when the page comes back into view. */
    meet(present: StoredAnswers): void {
      for (const question of questionNames) {
        const stored = present[question];
        // An answer that was under way while something was saved may be older than what is here.
        if (stored && stored.version > stateOf(question).stored.version)
          put(question, meetPresent(stateOf(question), stored));
      }
      show();
    },
    hearOtherTab(question: QuestionName, stored: StoredAnswer): void {
      put(question, meetOtherTab(stateOf(question), stored));
      lastSavedAt = Math.max(lastSavedAt ?? 0, stored.savedAt ?? 0) || null;
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
    getSnapshot: (): AnswersSnapshot => snapshot,
    subscribe(read: () => void): () => void {
      readers.add(read);
      return () => readers.delete(read);
    },
    /** Hears of each question whose content came from elsewhere than its form. */
    onReplaced(hear: (question: QuestionName) => void): () => void {
      replacedReaders.add(hear);
      return () => replacedReaders.delete(hear);
    },
  };
}
