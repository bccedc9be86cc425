/** Reading and writing texts: pure functions on strings, no clock, no database, no words of the product. */

export { readConsentAnswer } from './consent-answer.ts';
export { countSegments, type SegmentCount } from './count-segments.ts';
export { foldWords } from './fold-words.ts';
export { countSeptets, isSevenBit } from './gsm-alphabet.ts';
export { maskPhone } from './mask-phone.ts';
export type { TextLanguage } from './plain-letter-tables.ts';
export { toPlainLetters } from './plain-letters.ts';
export { isPracticeNumber } from './practice-answer.ts';
export { readReply } from './read-reply.ts';
export type { ExpectedItem, Reply, ReplyExpectation, ReplyIntent } from './reply.ts';
export { replyIntents } from './reply.ts';
export { type ReservedMeaning, readReservedWord, reservedWords } from './reserved-words.ts';
export { findRunMention, readRunChoice } from './run-mention.ts';
