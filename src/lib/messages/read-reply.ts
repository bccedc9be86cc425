import { foldWords } from './fold-words.ts';
import { readCommand, speaksOfDanger } from './read-command.ts';
import { readActual } from './read-settings.ts';
import { readValues } from './read-values.ts';
import type { Reply, ReplyExpectation, ReplyIntent } from './reply.ts';
import { commandWords, fillerWords, markedVietnameseYes, yesInVietnamese } from './reply-words.ts';
import { readReservedWord } from './reserved-words.ts';
import { findRunMention } from './run-mention.ts';
import { toTypedSigns } from './typed-signs.ts';
import { listWords } from './word-spans.ts';

/**
 * Reads what somebody texted back, forgiving but never guessing: what has two meanings comes back with `ask`, what has
 * none as `unreadable`. No number is returned that does not stand in the text.
 * @param text what came in, as it came
 * @param expects what this phone was asked
 */
export function readReply(text: string, expects: ReplyExpectation): Reply {
  const typed = toTypedSigns(text).trim();
  if (speaksOfDanger(typed)) return { intent: 'danger' };
  if (/^[?\u00bf\s]+$/u.test(typed) && typed !== '') return { intent: 'help' };
  if (/^[\u{1f44d}\u{1f44c}][\u{1f3fb}-\u{1f3ff}]?$/u.test(typed)) return { intent: 'yes' };
  const reserved = readReservedWord(typed);
  if (reserved !== undefined) return { intent: foldWords(typed) === 'yes' ? 'yes' : reserved };
  if (isVietnameseYes(typed, expects)) return { intent: 'yes' };

  const mention = findRunMention(typed);
  const run = mention.run === undefined ? {} : { run: mention.run };
  const command = readCommand(mention.rest);
  if (!command) return readReading(mention.rest, mention.run, expects);
  const { intent, rest } = command;
  switch (intent) {
    case 'skip':
      return { intent, ...run, ...readCommandRun(rest) };
    case 'later':
      return { intent, ...run, ...readMinutes(rest) };
    case 'problem':
    case 'newBatch':
      return { intent, ...run, ...wordsOf(rest) };
    case 'cannot': {
      const actual = readActual(rest, expects.settings);
      return { intent, ...run, ...(actual ? { actual } : {}), ...wordsOf(rest) };
    }
    case 'fix':
      return readFix(rest, mention.run, expects);
    case 'done':
      return readDone(rest, mention.run, expects);
    default:
      return readAnswer(intent, rest, mention.run, expects);
  }
}

const wordsOf = (rest: string) => (rest === '' ? {} : { words: rest });

function isVietnameseYes(typed: string, { language }: ReplyExpectation): boolean {
  if (!yesInVietnamese.includes(foldWords(typed))) return false;
  return language === 'vi' || markedVietnameseYes.has(typed.toLowerCase().replace(/[^\p{L}]/gu, ''));
}

/** Whether nothing stands there but words that add nothing, or say the same again ("yes, correct"). */
function isFiller(rest: string, intent: ReplyIntent): boolean {
  const same = new Set((commandWords[intent] ?? []).flatMap((phrase) => phrase.split(' ')));
  return listWords(rest).every(({ word }) => fillerWords.has(word) || same.has(word));
}

/** `SKIP 4`, `SKIP run 4`: here a bare number can only be a run's. */
function readCommandRun(rest: string): { run?: number } {
  const { run } = findRunMention(rest);
  if (run !== undefined) return { run };
  const alone = /^#?(\d{1,3})[.!]?$/.exec(rest);
  return alone ? { run: Number(alone[1]) } : {};
}

function readMinutes(rest: string): { minutes?: number } {
  const found = /^\D{0,12}?(\d{1,3})\s*(\p{L}*)[.!]?$/u.exec(rest);
  if (!found) return {};
  const isHours = /^(?:h|hr|hrs|hours?|horas?|godz|godzin\p{L}*|gio|tieng)$/u.test(foldWords(found[2] ?? ''));
  const minutes = Number(found[1]) * (isHours ? 60 : 1);
  return minutes >= 1 ? { minutes } : {};
}

function readDone(rest: string, named: number | undefined, expects: ReplyExpectation): Reply {
  if (isFiller(rest, 'done')) return { intent: 'done', ...runOf(named ?? soleRun(expects, 'make')) };
  const { run } = readCommandRun(rest);
  const makes = expects.openRuns.some((open) => open.run === run);
  if (run !== undefined && makes && named === undefined) return { intent: 'done', run };
  const reading = readReading(rest, named, expects);
  if (reading.intent !== 'reading') return { intent: 'unreadable' };
  // "Done 50" may speak of parts: the numbers count only where they look like the result.
  if (reading.ask !== undefined || !isExpected(reading, expects)) {
    return { intent: 'done', ...runOf(reading.run), ask: reading.ask ?? 'whichNumber' };
  }
  return reading;
}

function isExpected({ values = {} }: Reply, { plausible = {} }: ReplyExpectation): boolean {
  return Object.entries(values).every(([key, numbers]) => {
    const range = plausible[key];
    return range !== undefined && numbers.every((value) => value >= range[0] && value <= range[1]);
  });
}

function readFix(rest: string, named: number | undefined, expects: ReplyExpectation): Reply {
  const mention = findRunMention(rest);
  const run = named ?? mention.run;
  const { items, plausible } = expects;
  const read = readValues(mention.rest, items, { plausible, leadingRun: run === undefined });
  if ('ask' in read) return { intent: 'fix', ...runOf(run), ask: read.ask };
  if (!('values' in read)) return { intent: 'fix', ...runOf(run), ask: 'howMany' };
  return { intent: 'fix', ...runOf(run ?? read.run), values: read.values };
}

/** Yes, no, help, link: alone, or with the right number behind it ("no, 42.1"). */
function readAnswer(
  intent: ReplyIntent,
  rest: string,
  named: number | undefined,
  expects: ReplyExpectation,
): Reply {
  if (isFiller(rest, intent)) return { intent, ...runOf(named) };
  if (intent !== 'yes' && intent !== 'no') return { intent: 'unreadable' };
  const reading = readReading(rest, named, expects);
  // "No. 3: 41.5" names a run, "no 3" does not.
  const startsWithOpenRun = expects.openRuns.some(({ run }) =>
    new RegExp(`^${run}\\b(?![.,]\\d)`).test(rest),
  );
  const isDoubtful = intent === 'no' && startsWithOpenRun && reading.values !== undefined;
  return isDoubtful ? { intent: 'reading', ask: 'whichNumber' } : reading;
}

const runOf = (run: number | undefined) => (run === undefined ? {} : { run });

function soleRun({ openRuns }: ReplyExpectation, state: 'make' | 'measure'): number | undefined {
  const runs = openRuns.filter((open) => open.state === state);
  return runs.length === 1 ? runs[0]?.run : undefined;
}

function readReading(text: string, named: number | undefined, expects: ReplyExpectation): Reply {
  const { items, openRuns, plausible } = expects;
  const run = named ?? soleRun(expects, 'make') ?? (openRuns.length === 1 ? openRuns[0]?.run : undefined);
  const read = readValues(text, items, { plausible });
  if ('nothing' in read || 'words' in read) return { intent: 'unreadable', ...runOf(named) };
  const reading: Reply = { intent: 'reading', ...runOf(run) };
  if ('ask' in read) return { ...reading, ask: read.ask };
  const withValues = { ...reading, values: read.values };
  if (run === undefined) return { ...withValues, ask: 'whichRun' };
  return equalsSetting(read.values, expects) ? { ...withValues, ask: 'sameAsSetting' } : withValues;
}

/** Somebody who texts the dial instead of the result. A count among other numbers cannot be meant so. */
function equalsSetting(values: Record<string, number[]>, { items, settings }: ReplyExpectation): boolean {
  const dials = settings.map(({ value }) => (typeof value === 'number' ? value : Number(value || 'none')));
  const isLone = Object.values(values).flat().length === 1;
  return items.some(
    ({ key, kind }) =>
      (kind === 'measured' || isLone) && (values[key] ?? []).some((value) => dials.includes(value)),
  );
}
