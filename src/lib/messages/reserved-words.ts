import { foldWords } from './fold-words.ts';

/** What the carrier's reserved words mean. `start` lets texts through again at the service; it is not consent. */
export type ReservedMeaning = 'stop' | 'start' | 'help';

/** The words that the text service itself acts on, in capitals. They are the carrier's, in English only. */
export const reservedWords: Readonly<Record<ReservedMeaning, readonly string[]>> = {
  stop: ['STOP', 'STOPALL', 'UNSUBSCRIBE', 'CANCEL', 'END', 'QUIT', 'REVOKE', 'OPTOUT'],
  start: ['START', 'UNSTOP', 'YES'],
  help: ['HELP', 'INFO'],
};

const meaningOf: ReadonlyMap<string, ReservedMeaning> = new Map(
  (Object.keys(reservedWords) as ReservedMeaning[]).flatMap((meaning) =>
    reservedWords[meaning].map((word): [string, ReservedMeaning] => [word.toLowerCase(), meaning]),
  ),
);

/**
 * Recognises a text that is one reserved word and nothing else. Case, spaces and punctuation do not count:
 * somebody who texts "Stop!" wants no more texts, whether the carrier sees it or not.
 * @returns its meaning, or undefined for anything longer ("stop the machine" is not an opt-out)
 */
export function readReservedWord(text: string): ReservedMeaning | undefined {
  return meaningOf.get(foldWords(text).replaceAll(' ', ''));
}
