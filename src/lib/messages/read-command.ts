import type { ReplyIntent } from './reply.ts';
import { commandWords } from './reply-words.ts';
import { isSlipOf, listWords, matchPhrase, type WordSpan } from './word-spans.ts';

export interface Command {
  intent: ReplyIntent;
  /** What stands behind the command, as it was typed. */
  rest: string;
}

const entries = Object.entries(commandWords).flatMap(([intent, phrases]) =>
  phrases.map((phrase) => ({ intent: intent as ReplyIntent, phrase })),
);

/**
 * The command a text begins with: the longest phrase that fits; failing that, a slip of the thumb for exactly one
 * command.
 */
export function readCommand(text: string): Command | undefined {
  const words = listWords(text);
  const fitting = entries
    .map((entry) => ({ ...entry, length: matchPhrase(words, entry.phrase) }))
    .filter(({ length }) => length > 0)
    .sort((one, other) => other.phrase.length - one.phrase.length)[0];
  if (fitting) return { intent: fitting.intent, rest: restAfter(text, words, fitting.length) };
  const first = words[0];
  if (!first) return undefined;
  const meant = new Set(
    entries
      .filter(({ phrase }) => !phrase.includes(' ') && isSlipOf(first.word, phrase))
      .map(({ intent }) => intent),
  );
  const [intent, second] = [...meant];
  return intent && !second ? { intent, rest: restAfter(text, words, 1) } : undefined;
}

function restAfter(text: string, words: readonly WordSpan[], count: number): string {
  return text
    .slice(words[count - 1]?.end ?? 0)
    .replace(/^[\s:;,.!-]+/u, '')
    .trim();
}

/**
 * Whether the word for danger stands anywhere in a text, slips of the thumb included. A hold too many costs minutes; one
 * too few may cost a hand.
 */
export function speaksOfDanger(text: string): boolean {
  const words = listWords(text);
  return (commandWords.danger ?? []).some((phrase) =>
    words.some(
      ({ word }, place) =>
        matchPhrase(words.slice(place), phrase) > 0 ||
        (phrase.length >= 6 && isSlipOf(word, phrase.replaceAll(' ', ''))),
    ),
  );
}
