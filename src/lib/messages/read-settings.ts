import { foldWords } from './fold-words.ts';
import { listWords } from './word-spans.ts';

/** The last number, a unit of a few letters allowed behind it. */
const numberAtEnd = /(?:^|[\s:=])([+-]?\d+(?:[.,]\d+)?)\s*(?:[^\d\s]{1,3}\.?)?\s*$/u;
const wordAtEnd = /(?:^|[\s:=])([\p{L}\p{N}]+)[^\p{L}\p{N}]*$/u;

type Setting = { name: string; value: number | string };

/**
 * How far a setting got: `JAW TEMP 155`. The name may be shortened as long as only one setting can be meant.
 * @returns the setting's own name with the value as it was typed, or undefined where either is not sure
 */
export function readActual(
  rest: string,
  settings: readonly Setting[],
): { name: string; value: string } | undefined {
  const value = (numberAtEnd.exec(rest) ?? wordAtEnd.exec(rest))?.[1];
  if (value === undefined) return undefined;
  const words = listWords(rest).map(({ word }) => word);
  const name = findSetting(words, settings);
  if (name === undefined || foldWords(name).split(' ').includes(foldWords(value))) return undefined;
  const isNumber = /^[+-]?\d/.test(value);
  const setting = settings.find((one) => one.name === name);
  if (!isNumber && typeof setting?.value === 'number') return undefined;
  return { name, value };
}

/** The one setting whose name stands in the words, whole or in part; undefined where none or several do. */
function findSetting(words: readonly string[], settings: readonly Setting[]): string | undefined {
  const named = settings.map(({ name }) => ({ name, parts: foldWords(name).split(' ') }));
  const whole = named.filter(({ parts }) => ` ${words.join(' ')} `.includes(` ${parts.join(' ')} `));
  const longest = Math.max(0, ...whole.map(({ parts }) => parts.length));
  const best = whole.filter(({ parts }) => parts.length === longest);
  if (best.length > 0) return best.length === 1 ? best[0]?.name : undefined;
  const partly = named.filter(({ parts }) =>
    parts.some((part) => part.length > 1 && !/^\d+$/.test(part) && words.includes(part)),
  );
  return partly.length === 1 ? partly[0]?.name : undefined;
}
