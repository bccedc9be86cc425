import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import type { Brief } from '../brief.ts';
import { layOutRuns } from './lay-out-runs.ts';
import { PlanError } from './plan-error.ts';
import type { Proposal } from './proposal.ts';
import { errorPlanSchema, proposalSchema } from './proposal-schema.ts';
import { proposePlans } from './propose-plans.ts';

const store = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

describe('a stored proposal', () => {
  test('comes back as it was and is laid out run for run as it was', () => {
    let stored = 0;
    const seen = { full: false, fraction: false, irregular: false, grouped: false };
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), fc.nat(), (brief, seed) => {
        for (const proposal of tryPlans(brief)) {
          stored++;
          const read = proposalSchema.parse(store(proposal));
          expect(read).toEqual(proposal);
          expect(proposalSchema.parse(read)).toEqual(proposal);
          expect(errorPlanSchema.parse(store(proposal.errorPlan))).toEqual(proposal.errorPlan);
          expect(layOutRuns(brief, read, seed)).toEqual(layOutRuns(brief, proposal, seed));
          seen.full ||= proposal.resolution === Number.POSITIVE_INFINITY;
          seen.fraction ||= Number.isFinite(proposal.resolution);
          seen.irregular ||= proposal.efficiencies !== undefined;
          seen.grouped ||= proposal.wholePlots !== undefined;
        }
      }),
      { numRuns: 120 },
    );
    expect(stored).toBeGreaterThan(150);
    expect(seen).toEqual({ full: true, fraction: true, irregular: true, grouped: true });
  });

  test('of a full factorial has a resolution of null in between', () => {
    const full = proposePlans(buildBrief(2))[0];
    expect(store(full)).toHaveProperty('resolution', null);
    expect(proposalSchema.parse(store(full)).resolution).toBe(Number.POSITIVE_INFINITY);
  });

  test('that lost a part or holds a stranger is refused by the path of the fault', () => {
    const [proposal] = proposePlans(buildBrief(3));
    const { layout: _, ...torn } = proposal ?? {};
    expect(proposalSchema.safeParse(store(torn)).error?.issues[0]?.path).toEqual(['layout']);
    const odd = { ...proposal, warnings: [{ kind: 'nice-day', values: {}, refs: {} }] };
    expect(proposalSchema.safeParse(odd).error?.issues[0]?.path.slice(0, 2)).toEqual(['warnings', 0]);
  });
});

function tryPlans(brief: Brief): Proposal[] {
  try {
    return proposePlans(brief);
  } catch (error) {
    if (error instanceof PlanError) return [];
    throw error;
  }
}
