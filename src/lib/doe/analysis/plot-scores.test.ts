import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { halfNormalScores, normalScores } from './plot-scores.ts';

const scores = z.array(z.number());
const tablesSchema = z.looseObject({
  plotScores: z.array(
    z.object({ m: z.number(), halfNormalScores: scores, normalScores: scores, blomNormalScores: scores }),
  ),
});
const file = new URL('../../../../tests/fixtures/reference/distributions.json', import.meta.url);
const { plotScores } = tablesSchema.parse(JSON.parse(readFileSync(file, 'utf8')));

const agree = (found: number[], expected: number[]) => {
  expect(found).toHaveLength(expected.length);
  for (const [place, score] of found.entries())
    expect(Math.abs(score - (expected[place] ?? 0))).toBeLessThan(1e-12);
};

describe.each(plotScores)('plot scores of $m values', ({ m, ...expected }) => {
  const ascending = Array.from({ length: m }, (_, index) => index + 1);

  it('agree with the reference', () => {
    agree(normalScores(ascending), expected.blomNormalScores);
    agree(normalScores(ascending, 'midpoint'), expected.normalScores);
    agree(halfNormalScores(ascending), expected.halfNormalScores);
  });
});

describe('plot scores', () => {
  it('stay with their values, and go by size on a half-normal plot', () => {
    const [low, middle, high] = normalScores([1, 2, 3]);
    expect(normalScores([3, 1, 2])).toEqual([high, low, middle]);
    expect(halfNormalScores([-5, 1, 3])).toEqual(halfNormalScores([5, 1, 3]));
    expect(normalScores([])).toEqual([]);
  });

  it('are those of distinct ranks for equal values', () => {
    expect(normalScores([4, 4, 4])).toEqual(normalScores([1, 2, 3]));
  });

  it('refuse what is no number', () => {
    expect(() => normalScores([1, Number.NaN])).toThrow(RangeError);
  });
});
