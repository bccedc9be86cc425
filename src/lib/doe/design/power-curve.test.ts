import { describe, expect, it } from 'vitest';
import { buildBrief } from '../../../../tests/builders/brief.ts';
import { powerCurve } from './power-curve.ts';
import type { Proposal } from './proposal.ts';
import { proposePlans } from './propose-plans.ts';

function plan(settings: number, like: (proposal: Proposal) => boolean, maxRuns = 20): Proposal {
  const found = proposePlans(buildBrief(settings, { budget: { maxRuns } })).find(like);
  if (!found) throw new RangeError(`no such plan of ${settings} settings`);
  return found;
}

const exact = [0.17209291, 0.4900273, 0.79780786, 0.95016127];

describe('the power of a plan', () => {
  it('is that of the non-central t: 2^3 with three center points, three degrees of freedom', () => {
    const proposal = plan(3, ({ baseRuns, replicates, centerPoints }) => {
      return baseRuns === 8 && replicates === 1 && centerPoints === 3;
    });
    expect(proposal.errorPlan.df).toBe(3);
    const rows = powerCurve(proposal) ?? [];
    const at = (size: number) => rows.find((row) => row.size === size);
    // R: pt(qt(.975, 3), 3, d / sqrt(1/2), lower = FALSE) + pt(-qt(.975, 3), 3, d / sqrt(1/2)) for d = 1 to 4.
    for (const [place, power] of exact.entries()) expect(at(place + 1)?.likely).toBeCloseTo(power, 6);
    for (const { likely, clear } of rows) expect(clear).toBeLessThan(likely);
  });

  it('agrees with the power that the plan promises at W', () => {
    for (const settings of [3, 4, 5])
      for (const proposal of proposePlans(
        buildBrief(settings, { noise: { sd: 1.5, of: 'runMean', setup: 0 } }),
      )) {
        const atTwo = powerCurve(proposal)?.find(({ size }) => size === 2)?.likely;
        if (proposal.powerAtWorthHaving === null) expect(atTwo).toBeUndefined();
        else expect(atTwo).toBeCloseTo(proposal.powerAtWorthHaving, 6);
      }
  });

  it('says nothing of a plan without an error estimate', () => {
    const proposal = plan(3, () => true);
    const errorPlan = { ...proposal.errorPlan, rung: 'none' as const, df: null };
    expect(powerCurve({ ...proposal, errorPlan })).toBeNull();
  });
});
