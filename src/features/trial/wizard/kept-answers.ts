import { isQuestionName, type QuestionName } from '../answers.schema.ts';

/** What was typed and is not known to be saved. */
export interface KeptAnswer {
  base: number;
  content: unknown;
  /** What was last sent and not answered, with its save: it may have arrived. */
  sent?: { save: string; content: unknown } | undefined;
}

/** The copy in the browser, one entry a question, so that two tabs do not write over each other's. */
export interface AnswerKeep {
  read(): Map<QuestionName, KeptAnswer>;
  write(question: QuestionName, kept: KeptAnswer): void;
  remove(question: QuestionName): void;
}

function parseKept(text: string | null): KeptAnswer | null {
  try {
    const kept: unknown = JSON.parse(text ?? 'null');
    if (typeof kept !== 'object' || kept === null) return null;
    return 'base' in kept && typeof kept.base === 'number' && 'content' in kept ? (kept as KeptAnswer) : null;
  } catch {
    return null;
  }
}

/**
 * Keeps unsaved answers in the browser's store. A full or forbidden store is no error: typing goes on, and the page still
 * says that it is not saved yet.
 * @param owner whose typing it is: on a shared tablet nobody sends what somebody else typed
 */
export function keepIn(storage: Storage, trialId: string, owner: string): AnswerKeep {
  const prefix = `trywell.answers.${owner}.${trialId}.`;
  const quietly = (work: () => void) => {
    try {
      work();
    } catch {
      // Nothing to do: the answer is still on the page and on its way to the server.
    }
  };
  return {
    read() {
      const found = new Map<QuestionName, KeptAnswer>();
      quietly(() => {
        for (let place = 0; place < storage.length; place += 1) {
          const key = storage.key(place) ?? '';
          const name = key.slice(prefix.length);
          const kept = key.startsWith(prefix) ? parseKept(storage.getItem(key)) : null;
          if (kept && isQuestionName(name)) found.set(name, kept);
        }
      });
      return found;
    },
    write: (question, kept) => quietly(() => storage.setItem(prefix + question, JSON.stringify(kept))),
    remove: (question) => quietly(() => storage.removeItem(prefix + question)),
  };
}
