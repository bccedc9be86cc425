import { type Answers, type QuestionName, questionNames } from '../answers.schema.ts';
import type { AnswerKeep } from './kept-answers.ts';
import { isDue, isUnsaved, neverSaved, type QuestionState, takeOver } from './question-state.ts';
import { type AnswersSnapshot, type SaveState, type StoredAnswers, sameContent } from './stored-answers.ts';

/** Where a question's new content comes from: its own form shows it already. */
export type ContentSource = 'its form' | 'elsewhere';

/** Every question's state on this page, with whoever wants to hear of changes. It sends nothing by itself. */
export function createAnswerBook(first: StoredAnswers) {
  const states = new Map<QuestionName, QuestionState>();
  for (const name of questionNames) {
    const stored = first[name];
    if (stored) states.set(name, takeOver(stored));
  }
  const readers = new Set<() => void>();
  const replacedReaders = new Set<(question: QuestionName) => void>();
  let keep: AnswerKeep | null = null;
  const times = [...states.values()].map(({ stored }) => stored.savedAt ?? 0);
  let lastSavedAt: number | null = Math.max(0, ...times) || null;
  /** What went wrong with the last save, until one succeeds. */
  let trouble: SaveState | null = null;
  let snapshot = takeSnapshot();

  function hasDue(): boolean {
    return [...states.values()].some(isDue);
  }

  function describeSave(): SaveState {
    if (hasDue()) return trouble ?? { kind: 'saving' };
    if ([...states.values()].some(({ theirs }) => theirs)) return { kind: 'undecided' };
    const lasts = trouble?.kind === 'refused' || trouble?.kind === 'signed out';
    return trouble && lasts ? trouble : { kind: 'saved', at: lastSavedAt };
  }

  function takeSnapshot(): AnswersSnapshot {
    const answered = [...states].filter(([, { content }]) => content !== undefined);
    return {
      answers: Object.fromEntries(answered.map(([name, { content }]) => [name, content])) as Answers,
      save: describeSave(),
      conflicts: [...states].flatMap(([question, { content, theirs }]) =>
        theirs ? [{ question, mine: content, theirs }] : [],
      ),
    };
  }

  function stateOf(question: QuestionName): QuestionState {
    return states.get(question) ?? takeOver(neverSaved);
  }

  return {
    stateOf,
    hasDue,
    entries: () => [...states],
    /** Begins to keep a copy of what is unsaved. */
    keepIn(store: AnswerKeep): void {
      keep = store;
    },
    /** Puts a question's new state in place, in the browser's copy too. */
    put(question: QuestionName, next: QuestionState, from: ContentSource = 'elsewhere'): void {
      const before = stateOf(question);
      states.set(question, next);
      if (isUnsaved(next)) {
        const { content, stored, sent } = next;
        keep?.write(question, { base: stored.version, content, ...(sent ? { sent } : {}) });
      } else keep?.remove(question);
      const isNews = from === 'elsewhere' && !sameContent(before.content, next.content);
      if (isNews) for (const hear of replacedReaders) hear(question);
    },
    noteSaved(at: number | null): void {
      lastSavedAt = Math.max(lastSavedAt ?? 0, at ?? 0) || null;
    },
    noteTrouble(what: SaveState | null): void {
      trouble = what;
    },
    troubleKind: () => trouble?.kind,
    /** Lets the page see what has changed. */
    show(): void {
      snapshot = takeSnapshot();
      for (const read of readers) read();
    },
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
