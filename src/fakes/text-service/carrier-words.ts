/**
 * The reserved words as the text service itself acts on them: the whole text, in any case, spaces around it allowed.
 * Kept apart from the product's own reading, so that each is checked against the other.
 */
const stopWords = new Set(['STOP', 'STOPALL', 'UNSUBSCRIBE', 'CANCEL', 'END', 'QUIT', 'REVOKE', 'OPTOUT']);
const startWords = new Set(['START', 'UNSTOP', 'YES']);
const helpWords = new Set(['HELP', 'INFO']);

export type CarrierAction = 'opt out' | 'opt in' | 'help' | 'none';

/**
 * @param body what the phone sent
 * @param isOptedOut whether this phone had opted out of this number; only then does a start word do anything
 */
export function decideCarrierAction(body: string, isOptedOut: boolean): CarrierAction {
  const word = body.trim().toUpperCase();
  if (stopWords.has(word)) return 'opt out';
  if (startWords.has(word)) return isOptedOut ? 'opt in' : 'none';
  return helpWords.has(word) ? 'help' : 'none';
}

/** What the service answers of its own accord. */
export const carrierAnswers: Readonly<Record<Exclude<CarrierAction, 'none'>, string>> = {
  'opt out': 'You have ended texts from this number. Text START to get them again.',
  'opt in': 'You get texts from this number again. Text STOP to end them, HELP for help.',
  help: 'Text STOP to end texts from this number. Message and data rates may apply.',
};
