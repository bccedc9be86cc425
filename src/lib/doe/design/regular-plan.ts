import type { Alias } from './proposal.ts';
import { compareWords, lengthOfWord, readWord, type Word, writeWord } from './words.ts';

/** A word that equals +1 or -1 in every run. */
export interface DefiningWord {
  word: Word;
  sign: 1 | -1;
}

/** How the terms of a regular two-level plan are tied to each other. */
export interface WordStructure {
  k: number;
  /** Without the empty word; shortest first, then alphabetically. */
  definingWords: DefiningWord[];
  /** Length of the shortest defining word; Infinity for a full factorial. */
  resolution: number;
  /** Number of defining words of length 3, 4, …, k. */
  wordLengthPattern: number[];
  /** For each contrast of the corners all words that it estimates together, shortest first; ordered by their first words. */
  chains: Word[][];
  /** Chain index of every word of k letters; -1 for the empty word and the defining ones. */
  chainOf: number[];
}

/** A regular two-level plan, with all that follows from its generators. */
export interface RegularPlan extends WordStructure {
  /** Signed: 'D=-ABC'. */
  generators: string[];
  /** Coded settings of each corner, in standard order: the first setting changes fastest. */
  corners: number[][];
}

/**
 * Builds the plan of k settings in which each generator ('D=ABC', 'D=-ABC') makes one setting a product of the free ones.
 *
 * @throws RangeError when a generator cannot be read or uses a setting that is itself generated.
 */
export function buildRegularPlan(k: number, generators: readonly string[]): RegularPlan {
  const read = generators.map((generator) => readGenerator(generator, k));
  const generated = read.reduce((word, generator) => word | generator.made, 0);
  const clash = read.find((generator) => generator.product & generated);
  if (clash)
    throw new RangeError(
      `buildRegularPlan: generators must use free settings, got ${writeWord(clash.product)}`,
    );
  const definingWords = multiplyOut(read.map(({ made, product, sign }) => ({ word: made ^ product, sign })));
  return {
    ...describeWords(k, definingWords),
    generators: [...generators],
    corners: listCorners(k, read, generated),
  };
}

/** All that follows from the words that are the same in every corner. */
export function describeWords(k: number, words: readonly DefiningWord[]): WordStructure {
  const definingWords = [...words].sort((first, second) => compareWords(first.word, second.word));
  const lengths = definingWords.map(({ word }) => lengthOfWord(word));
  const chains = listChains(k, definingWords);
  const chainOf = new Array<number>(2 ** k).fill(-1);
  for (const [index, chain] of chains.entries()) for (const word of chain) chainOf[word] = index;
  return {
    k,
    definingWords,
    resolution: lengths.length === 0 ? Number.POSITIVE_INFINITY : Math.min(...lengths),
    wordLengthPattern: Array.from(
      { length: Math.max(0, k - 2) },
      (_, index) => lengths.filter((length) => length === index + 3).length,
    ),
    chains,
    chainOf,
  };
}

/**
 * Alias chains: for each group of terms that one contrast estimates together, the shortest term and all others with their signs. Chains of one term
 * are left out, so a full factorial has none.
 */
export function listAliases({ definingWords, chains }: WordStructure): Alias[] {
  if (definingWords.length === 0) return [];
  const signOf = new Map(definingWords.map(({ word, sign }) => [word, sign]));
  return chains.map(([first = 0, ...others]) => ({
    term: writeWord(first),
    with: others.map((word) => ({ term: writeWord(word), coefficient: signOf.get(word ^ first) ?? 1 })),
  }));
}

function listChains(k: number, definingWords: readonly DefiningWord[]): Word[][] {
  const subgroup = [0, ...definingWords.map(({ word }) => word)];
  const seen = new Set<Word>(subgroup);
  const chains: Word[][] = [];
  for (const word of Array.from({ length: 2 ** k }, (_, index) => index).sort(compareWords)) {
    if (seen.has(word)) continue;
    const chain = subgroup.map((defining) => word ^ defining).sort(compareWords);
    for (const member of chain) seen.add(member);
    chains.push(chain);
  }
  return chains;
}

/** Defining words as text: 'ABCD', '-ABCD'. */
export function writeDefiningWords(words: readonly DefiningWord[]): string[] {
  return words.map(({ word, sign }) => `${sign < 0 ? '-' : ''}${writeWord(word)}`);
}

interface Generator {
  made: Word;
  product: Word;
  sign: 1 | -1;
}

function readGenerator(text: string, k: number): Generator {
  const parts = /^([A-Z])=(-?)([A-Z]+)$/.exec(text);
  const [, made = '', minus, product = ''] = parts ?? [];
  const generator: Generator = { made: readWord(made), product: readWord(product), sign: minus ? -1 : 1 };
  if (parts === null || (generator.made | generator.product) >= 2 ** k)
    throw new RangeError(
      `buildRegularPlan: generators must look like D=ABC within ${k} settings, got ${text}`,
    );
  return generator;
}

function multiplyOut(independent: readonly DefiningWord[]): DefiningWord[] {
  let products: DefiningWord[] = [{ word: 0, sign: 1 }];
  for (const { word, sign } of independent)
    products = products.flatMap((product) => [
      product,
      { word: product.word ^ word, sign: product.sign === sign ? 1 : -1 },
    ]);
  return products.slice(1);
}

function listCorners(k: number, generators: readonly Generator[], generated: Word): number[][] {
  const free = Array.from({ length: k }, (_, index) => index).filter((index) => !((generated >> index) & 1));
  return Array.from({ length: 2 ** free.length }, (_, run) => {
    const corner = new Array<number>(k).fill(0);
    free.forEach((index, place) => {
      corner[index] = (run >> place) & 1 ? 1 : -1;
    });
    for (const { made, product, sign } of generators)
      corner[indexOfLetter(made)] = sign * multiply(product, corner);
    return corner;
  });
}

/** Value of a product of settings at a point. */
export function multiply(word: Word, x: readonly number[]): number {
  let product = 1;
  for (let index = 0; word >> index > 0; index++) if ((word >> index) & 1) product *= x[index] ?? 0;
  return product;
}

function indexOfLetter(letter: Word): number {
  return 31 - Math.clz32(letter);
}
