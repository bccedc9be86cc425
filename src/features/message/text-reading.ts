import type { Language } from '../../i18n/languages.ts';
import { isPracticeNumber, readConsentAnswer, readReservedWord } from '../../lib/messages/index.ts';
import type { Consent } from './send-guard.ts';

/** Where the talk with one phone stands. */
export const conversationStates = [
  'unasked',
  'asked',
  'practice',
  'idle',
  'run',
  'results',
  'sure',
  'which',
  'left',
] as const;
export type ConversationState = (typeof conversationStates)[number];

/** What a text means before any run is spoken of. */
export type FirstMeaning =
  /** No more texts, at once. */
  | 'optOut'
  /** The number lets texts in again: it may be asked once more, and nothing else. */
  | 'askAgain'
  | 'agree'
  | 'decline'
  | 'practiceDone'
  /** The text service answers this word itself. */
  | 'serviceAnswers'
  /** Nothing of these. */
  | 'other';

/**
 * Reads a text for consent and practice. Whatever concerns a run is left to the conversation's own table.
 * @param person.isSuppressed whether the number opted out, by this person or one before
 */
export function readFirstMeaning(
  body: string,
  person: { consent: Consent; isSuppressed: boolean; conversation: ConversationState; language: Language },
): FirstMeaning {
  const { consent, isSuppressed, conversation, language } = person;
  const reserved = readReservedWord(body);
  if (reserved === 'stop') return 'optOut';
  if (reserved === 'help') return 'serviceAnswers';
  if (consent === 'opted out' || isSuppressed) return reserved === 'start' ? 'askAgain' : 'other';
  if (consent === 'asked') {
    const answer = readConsentAnswer(body, language);
    if (answer === undefined) return 'other';
    return answer === 'yes' ? 'agree' : 'decline';
  }
  if (consent === 'agreed' && conversation === 'practice' && isPracticeNumber(body)) return 'practiceDone';
  return 'other';
}
