import { describe, expect, it } from 'vitest';
import { buildBrief } from '../../../../tests/builders/simulated-trial.ts';
import { proposePlans } from './propose-plans.ts';

describe('plans split into two batches', () => {
  it.each([
    [3, 12],
    [4, 12],
    [4, 16],
    [5, 20],
  ])(
    'of %i settings in up to %i runs judge by small effects only where there are seven of them',
    (settings, maxRuns) => {
      const brief = buildBrief(settings, {
        budget: { maxRuns },
        blocks: { name: 'batch', kind: 'batch', count: 2 },
      });
      for (const { id, errorPlan, baseRuns } of proposePlans(brief)) {
        if (!errorPlan.rung.startsWith('pseudo')) continue;
        // One contrast of the corner runs is what tells the batches apart.
        expect(errorPlan.contrasts, id).toBe(baseRuns - 2);
        expect(errorPlan.contrasts, id).toBeGreaterThanOrEqual(7);
      }
    },
  );
});
