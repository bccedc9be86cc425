import { describe, expect, it } from 'vitest';
import { buildBrief } from '../../../../tests/builders/simulated-trial.ts';
import { proposePlans } from '../design/propose-plans.ts';
import { analyze } from './analyze.ts';

describe('trials in two batches', () => {
  it.each([
    [3, 10],
    [4, 10],
    [4, 12],
    [5, 12],
    [6, 12],
    [4, 20],
  ])('of %i settings in up to %i runs can be analyzed, whatever plan was proposed', (settings, maxRuns) => {
    const brief = buildBrief(settings, {
      budget: { maxRuns },
      blocks: { name: 'batch', kind: 'batch', count: 2 },
    });
    const factors = brief.factors.map((_, place) => ({
      letter: String.fromCharCode(65 + place),
      kind: 'number' as const,
    }));
    for (const { layout, id } of proposePlans(brief)) {
      const runs = layout.map((run, index) => ({ ...run, y: Math.sin(7 * index) }));
      const { terms, error } = analyze({ factors, runs });
      const judged = terms.filter(({ ci }) => ci !== null).length;
      expect(judged, id).toBe(error.source === 'none' ? 0 : terms.length);
    }
  });
});
