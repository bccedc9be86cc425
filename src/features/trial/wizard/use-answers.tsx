import { useEffect, useState, useSyncExternalStore } from 'react';
import type { QuestionName } from '../answers.schema.ts';
import { type AnswersStore, createAnswersStore } from './answers-store.ts';
import { keepIn } from './kept-answers.ts';
import { loadAnswers, saveAnswer } from './save-answer.tsx';
import type { AnswersSnapshot, StoredAnswer, StoredAnswers } from './stored-answers.ts';

interface Wishes {
  trialId: string;
  /** Whose typing is kept in this browser. */
  readerId: string;
  first: StoredAnswers;
  mayWrite: boolean;
}

interface Saved {
  question: QuestionName;
  stored: StoredAnswer;
}

function later(milliseconds: number, work: () => void): () => void {
  const timer = setTimeout(work, milliseconds);
  return () => clearTimeout(timer);
}

/** Ties the store to this browser: its copy, its other tabs, its connection, and the moment the page is left. */
function connect(store: AnswersStore, trialId: string, readerId: string): () => void {
  const tabs = new BroadcastChannel(`trywell.answers.${trialId}`);
  tabs.addEventListener('message', ({ data }: MessageEvent<Saved>) =>
    store.hearOtherTab(data.question, data.stored),
  );
  store.start({
    send: (request) => saveAnswer(trialId, request),
    newSave: () => crypto.randomUUID(),
    keep: keepIn(localStorage, trialId, readerId),
    tell: (question, stored) => tabs.postMessage({ question, stored } satisfies Saved),
    later,
    soon: (work) => void later(0, work),
  });
  const leave = () => {
    for (const request of store.leaving()) void saveAnswer(trialId, request, { keepalive: true });
  };
  const online = () => void store.flush();
  const look = async () => {
    if (document.visibilityState === 'hidden') return leave();
    const present = await loadAnswers(trialId);
    if (present) store.meet(present);
  };
  window.addEventListener('pagehide', leave);
  window.addEventListener('online', online);
  document.addEventListener('visibilitychange', look);
  return () => {
    window.removeEventListener('pagehide', leave);
    window.removeEventListener('online', online);
    document.removeEventListener('visibilitychange', look);
    tabs.close();
    store.stop();
  };
}

/** The answers of this trial: shown at once, saved a moment later, kept in the browser until then. */
export function useAnswers(wishes: Wishes): { store: AnswersStore; snapshot: AnswersSnapshot } {
  const [store] = useState(() => createAnswersStore(wishes.first));
  const { trialId, readerId, mayWrite } = wishes;
  useEffect(() => {
    if (!mayWrite) return;
    return connect(store, trialId, readerId);
  }, [store, trialId, readerId, mayWrite]);
  const snapshot = useSyncExternalStore(store.subscribe, store.getSnapshot, store.getSnapshot);
  return { store, snapshot };
}
