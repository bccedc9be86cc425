import { describe, expect, test } from 'vitest';
import table from '../../../../tests/fixtures/reference/block-confounding.json' with { type: 'json' };
import { chooseBlockWords, listConfounded, partOf } from './block-words.ts';
import { catalogue } from './catalogue.ts';
import { buildRegularPlan } from './regular-plan.ts';
import { lengthOfWord, readWord } from './words.ts';

const lengthsOf = (terms: readonly string[]) => terms.map((term) => term.length).sort();

// Montgomery, Design and Analysis of Experiments, Table 7.9 (from memory; the full sets were recomputed).
describe('blocks of full factorials', () => {
  test.each(table.arrangements)(
    '2^$k in $blocks blocks hides no more than $confounded',
    ({ k, blocks, confounded }) => {
      const plan = buildRegularPlan(k, []);
      const words = chooseBlockWords(plan, Math.log2(blocks)) ?? [];
      expect(lengthsOf(hiddenBy(plan, words))).toEqual(lengthsOf(confounded));
    },
  );

  test.each(table.arrangements)(
    '2^$k in $blocks blocks: the printed generators give the printed sets and blocks',
    (row) => {
      const plan = buildRegularPlan(row.k, []);
      const words = row.generators.map(readWord);
      expect(hiddenBy(plan, words).sort()).toEqual([...row.confounded].sort());
      const parts = plan.corners.map((x) => partOf(words, x) + 1);
      expect(parts).toEqual(row.blockOfStandardOrder);
    },
  );
});

describe('blocks of fractions', () => {
  test('never hide a main effect, and split evenly', () => {
    for (const { k, generators, runs } of catalogue.filter((entry) => entry.runs >= 8)) {
      const plan = buildRegularPlan(k, generators);
      for (const count of [1, 2]) {
        const words = chooseBlockWords(plan, count);
        if (words === null) continue;
        expect(listConfounded(plan, words).filter((term) => term.length === 1)).toEqual([]);
        const sizes = Array.from(
          { length: 2 ** count },
          (_, part) => plan.corners.filter((x) => partOf(words, x) === part).length,
        );
        expect(sizes).toEqual(sizes.map(() => runs / 2 ** count));
      }
    }
  });

  test('are refused where every contrast holds a main effect', () => {
    expect(chooseBlockWords(buildRegularPlan(7, ['D=AB', 'E=AC', 'F=BC', 'G=ABC']), 1)).toBeNull();
  });

  test('name all pairs that go with them', () => {
    const plan = buildRegularPlan(4, ['D=ABC']);
    expect(listConfounded(plan, [readWord('AB')])).toEqual(['AB', 'CD']);
  });
});

function hiddenBy(plan: ReturnType<typeof buildRegularPlan>, words: readonly number[]): string[] {
  return listConfounded(plan, words).filter((term) => lengthOfWord(readWord(term)) > 0);
}
