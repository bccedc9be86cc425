import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { referenceExamples } from '../../../../tests/builders/reference-examples.ts';
import { analyze } from './analyze.ts';

const tableSchema = z.looseObject({
  seEffect: z.number(),
  effects: z.record(z.string(), z.number()),
  p: z.record(z.string(), z.number()),
});

// Rejects by Freeman & Tukey's transformation as Bisgaard & Fuller (1994, Quality Engineering 7) use it, computed with R 4.2.2.
describe('rejects out of a lot', () => {
  const example = referenceExamples.find(({ id }) => id === 'constructed-defectives-2-4-1');
  if (example === undefined) throw new Error('the example is missing');
  const wanted = tableSchema.parse(example.computed['freemanTukey']);
  const factors = [...'ABCD'].map((letter) => ({ letter, kind: 'number' as const }));
  const runs = example.runs.map((run) => ({
    x: [...'ABCD'].map((letter) => run.coded?.[letter] ?? Number.NaN),
    y: run.y,
    n: run.n ?? Number.NaN,
  }));

  it('have the effects of the transformed shares', () => {
    const { terms } = analyze({ factors, runs, scale: 'freeman-tukey' });
    for (const [term, effect] of Object.entries(wanted.effects)) {
      const found = terms.find((entry) => entry.term === term);
      expect(Math.abs((found?.effect ?? Number.NaN) - effect)).toBeLessThan(1e-9);
    }
  });

  it('are judged by theory alone where there is no other error, and then never together', () => {
    const seven = runs.slice(0, 7);
    const analysis = analyze({ factors, runs: seven, scale: 'freeman-tukey', terms: ['A', 'B'] });
    expect(analysis.error).toMatchObject({ source: 'known', df: null });
    expect(analysis.terms.every(({ p, pFamily }) => p !== null && pFamily === null)).toBe(true);
  });

  it('have theory as a floor under every other error', () => {
    const even = runs.map((run) => ({ ...run, y: 5 }));
    const { error, terms } = analyze({ factors, runs: even, scale: 'freeman-tukey' });
    expect(error.sd).toBeCloseTo(Math.sqrt(1 / 202), 12);
    expect(terms[0]?.se).toBeCloseTo(wanted.seEffect, 12);
  });

  it('weigh lots by what was inspected', () => {
    const uneven = runs.map((run, index) => ({ ...run, n: index < 4 ? 50 : 200, y: index < 4 ? 5 : 20 }));
    const { terms } = analyze({ factors, runs: uneven, scale: 'freeman-tukey', terms: ['A'] });
    expect(Math.abs(terms[0]?.effect ?? Number.NaN)).toBeLessThan(1e-9);
  });
});
