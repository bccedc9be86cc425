import { describe, expect, test } from 'vitest';
import table from '../../../../tests/fixtures/reference/minimum-aberration.json' with { type: 'json' };
import search from '../../../../tests/fixtures/reference/minimum-aberration-search.json' with {
  type: 'json',
};
import { catalogue } from './catalogue.ts';
import { buildRegularPlan, writeDefiningWords } from './regular-plan.ts';
import { lengthOfWord, readWord } from './words.ts';

/** Printed tables leave the letter I out. */
const inOurLetters = (text: string) =>
  text.replace(/[J-L]/g, (letter) => String.fromCharCode(letter.charCodeAt(0) - 1));

const chainsWithOnePair = (k: number, generators: readonly string[]) =>
  buildRegularPlan(k, generators).chains.filter(
    (chain) =>
      lengthOfWord(chain[0] ?? 0) === 2 && chain.filter((word) => lengthOfWord(word) <= 2).length === 1,
  ).length;

describe('all plans of Chen, Sun & Wu (1993) and Montgomery, Table 8.14, up to 11 settings in 32 runs', () => {
  test.each(table.designs)('$design', (design) => {
    const generators = design.generators.map(inOurLetters);
    const plan = buildRegularPlan(design.k, generators);
    expect(plan.corners).toHaveLength(design.runs);
    expect(plan.resolution).toBe(design.resolutionNumber);
    expect(plan.wordLengthPattern).toEqual([...design.publishedWordLengthPattern]);
    const words = design.definingWords.map((word) => readWord(inOurLetters(word)));
    expect(plan.definingWords.map(({ word }) => word).sort()).toEqual(words.sort());
    expect(chainsWithOnePair(design.k, generators)).toBe(design.clearTwoFactorInteractions);
  });
});

describe('the catalogue', () => {
  test('holds the printed generators', () => {
    for (const entry of catalogue.filter(({ generators }) => generators.length > 0)) {
      const printed = table.designs.find(({ k, runs }) => k === entry.k && runs === entry.runs);
      expect(entry.generators, `${entry.k} settings in ${entry.runs} runs`).toEqual(printed?.generators);
    }
    const missing = table.designs.filter(
      ({ k, runs }) => k <= 7 && !catalogue.some((entry) => entry.k === k && entry.runs === runs),
    );
    expect(missing).toEqual([]);
  });

  test('no choice of columns has less aberration: every one is tried', () => {
    const fractions = catalogue.filter(({ generators }) => generators.length > 0);
    for (const { k, runs, generators } of fractions) {
      const free = Math.log2(runs);
      const products = Array.from({ length: 2 ** free - 1 }, (_, index) => index + 1).filter(
        (word) => lengthOfWord(word) > 1,
      );
      const patterns = choose(products, k - free).map((chosen) => patternOf(chosen, free, k));
      const best = patterns.reduce((least, pattern) =>
        comparePatterns(pattern, least) < 0 ? pattern : least,
      );
      expect(buildRegularPlan(k, generators).wordLengthPattern).toEqual(best);
      const printed = search.results.find(
        (result) => result.design === `2^(${k}-${k - free})` && result.runs === runs,
      );
      expect(best).toEqual(printed?.best);
    }
  });

  test('a minus sign turns round the words that hold it, and nothing else', () => {
    const plan = buildRegularPlan(5, ['D=-AB', 'E=AC']);
    expect(writeDefiningWords(plan.definingWords)).toEqual(['-ABD', 'ACE', '-BCDE']);
    expect(plan.corners.every(([a = 0, b = 0, , d = 0]) => d === -a * b)).toBe(true);
    expect(plan.wordLengthPattern).toEqual(buildRegularPlan(5, ['D=AB', 'E=AC']).wordLengthPattern);
  });

  test('generators that cannot be read are a programmer’s error', () => {
    expect(() => buildRegularPlan(4, ['D:ABC'])).toThrow(/buildRegularPlan: generators must look like/);
    expect(() => buildRegularPlan(3, ['D=ABC'])).toThrow(RangeError);
    expect(() => buildRegularPlan(5, ['D=AB', 'E=CD'])).toThrow(/free settings/);
  });
});

function choose(words: readonly number[], count: number): number[][] {
  if (count === 0) return [[]];
  return words.flatMap((word, index) =>
    choose(words.slice(index + 1), count - 1).map((rest) => [word, ...rest]),
  );
}

/** Number of defining words of each length from three, for added columns that are these products. */
function patternOf(products: readonly number[], free: number, k: number): number[] {
  const pattern = new Array<number>(k - 2).fill(0);
  for (let some = 1; some < 2 ** products.length; some++) {
    const chosen = products.filter((_, index) => (some >> index) & 1);
    const product = chosen.reduce((word, other) => word ^ other, 0);
    const place = lengthOfWord(product & (2 ** free - 1)) + chosen.length - 3;
    if (place >= 0) pattern[place] = (pattern[place] ?? 0) + 1;
  }
  return pattern;
}

function comparePatterns(first: readonly number[], second: readonly number[]): number {
  const at = first.findIndex((count, index) => count !== second[index]);
  return at < 0 ? 0 : (first[at] ?? 0) - (second[at] ?? 0);
}
