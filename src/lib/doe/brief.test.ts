import { expect, test } from 'vitest';
import { type Brief, briefSchema } from './brief.ts';
import { factSchema } from './facts.ts';

const brief: Brief = {
  response: { name: 'seal strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3 },
  watch: [],
  factors: [
    { kind: 'number', name: 'jaw', unit: 'C', low: 140, high: 160, usual: 150, step: 1 },
    { kind: 'choice', name: 'film', low: 'A', high: 'B', usual: 'low' },
  ],
  forbidden: [{ A: 1, B: 1 }],
  budget: { maxRuns: 12 },
  noise: { sd: 2, of: 'runMean', df: 4 },
};

test('a stored brief comes back as it was', () => {
  expect(briefSchema.parse(JSON.parse(JSON.stringify(brief)))).toEqual(brief);
});

test('a brief of the wrong shape names where', () => {
  const wrong = briefSchema.safeParse({ ...brief, noise: { sd: 'much', of: 'part' } });
  expect(wrong.error?.issues[0]?.path).toEqual(['noise', 'sd']);
});

test('a fact keeps to its kind: no stray values, no unknown kind', () => {
  expect(factSchema.safeParse({ kind: 'pairs-tied', values: {}, refs: { terms: ['A', 'BC'] } }).success).toBe(
    true,
  );
  expect(factSchema.safeParse({ kind: 'pairs-tied', values: { words: 'x' }, refs: {} }).success).toBe(false);
  expect(factSchema.safeParse({ kind: 'nice-day', values: {}, refs: {} }).success).toBe(false);
});
