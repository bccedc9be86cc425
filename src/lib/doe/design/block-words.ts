import { multiply, type WordStructure } from './regular-plan.ts';
import { lengthOfWord, spanWords, type Word, wordOf, writeWord } from './words.ts';

/**
 * The words whose signs split a regular plan into 2 to the `count` blocks, chosen so that what differs between blocks matters least: never a main
 * effect, then as few pairs as possible, then as few products of three, and so on. null where every choice would hide a main effect.
 *
 * `grouped` are one-letter words of settings that stay put within whole plots: together with them, too, blocks must not fix any other setting.
 *
 * Agrees with the arrangements of Montgomery, Design and Analysis of Experiments, Table 7.9, in the number of terms of each length.
 */
export function chooseBlockWords(
  plan: WordStructure,
  count: number,
  grouped: readonly Word[] = [],
): Word[] | null {
  let best: { words: Word[]; harm: number[] } | null = null;
  const words = plan.chains.map((chain) => chain[0] ?? 0);
  for (const chosen of chooseIndependent(plan, words, count)) {
    const harm = countHarm(plan, chosen);
    if ((harm[0] ?? 0) > 0 || fixesOtherSetting(plan, chosen, grouped)) continue;
    if (best === null || compareHarm(harm, best.harm) < 0) best = { words: chosen, harm };
  }
  return best?.words ?? null;
}

/** Whether parts made by these words and whole plots made by `grouped` settings would leave another setting the same within each part. */
export function fixesOtherSetting(
  plan: WordStructure,
  words: readonly Word[],
  grouped: readonly Word[],
): boolean {
  // Asked for every choice of words in a search: only the letters are looked at, never whole chains.
  const span = spanIndices(plan, [...words, ...grouped]);
  for (let index = 0; index < plan.k; index++) {
    const letter = wordOf(index);
    if (!grouped.includes(letter) && span.has(plan.chainOf[letter] ?? -1)) return true;
  }
  return false;
}

/**
 * Terms that cannot be told apart from differences between blocks: of each chain its main effects and pairs, or its shortest term if it has none.
 */
export function listConfounded(plan: WordStructure, words: readonly Word[]): string[] {
  return spanChains(plan, words).flatMap((chain) => {
    const short = chain.filter((word) => lengthOfWord(word) <= 2);
    return (short.length > 0 ? short : chain.slice(0, 1)).map(writeWord);
  });
}

/** All chains in the span of some words, the mean left out. */
export function spanChains(plan: WordStructure, words: readonly Word[]): Word[][] {
  const indices = spanIndices(plan, words);
  return plan.chains.filter((_, index) => indices.has(index));
}

function spanIndices({ chainOf }: WordStructure, words: readonly Word[]): Set<number> {
  const indices = new Set<number>();
  for (const word of spanWords(words)) if (word !== 0) indices.add(chainOf[word] ?? -1);
  return indices;
}

/** Which part of the plan a corner belongs to, from 0, by the signs of the words. */
export function partOf(words: readonly Word[], corner: readonly number[]): number {
  return words.reduce((part, word, index) => part + (multiply(word, corner) > 0 ? 2 ** index : 0), 0);
}

/** All choices of `count` words of which none is a product of others, in the order of the list. */
export function* chooseIndependent(
  plan: WordStructure,
  words: readonly Word[],
  count: number,
  chosen: readonly Word[] = [],
): Generator<Word[]> {
  if (count === 0) {
    yield [...chosen];
    return;
  }
  const spanned = new Set([...spanWords(chosen)].map((word) => plan.chainOf[word] ?? -1));
  for (const [index, word] of words.entries()) {
    if (spanned.has(plan.chainOf[word] ?? -1)) continue;
    yield* chooseIndependent(plan, words.slice(index + 1), count - 1, [...chosen, word]);
  }
}

/** Hidden main effects, hidden pairs, then hidden chains by the length of their shortest word, from three. */
function countHarm(plan: WordStructure, words: readonly Word[]): number[] {
  const harm = new Array<number>(Math.max(2, plan.k)).fill(0);
  for (const chain of spanChains(plan, words)) {
    const shortest = lengthOfWord(chain[0] ?? 0);
    const pairs = chain.filter((word) => lengthOfWord(word) === 2).length;
    const place = shortest - 1;
    harm[place] = (harm[place] ?? 0) + (shortest === 2 ? pairs : 1);
    if (shortest === 1) harm[1] = (harm[1] ?? 0) + pairs;
  }
  return harm;
}

function compareHarm(first: readonly number[], second: readonly number[]): number {
  const at = first.findIndex((count, index) => count !== second[index]);
  return at < 0 ? 0 : (first[at] ?? 0) - (second[at] ?? 0);
}
