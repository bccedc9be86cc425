import { describe, expect, it } from 'vitest';
import { WHOLE_PLOT_PLANS } from '../../../../tests/bench/verdict/plans.ts';
import { studentizedMaximumModulusUpperTail } from '../distributions/studentized-maximum-modulus.ts';
import { analyze } from './analyze.ts';

const [eightPlots] = WHOLE_PLOT_PLANS;
const analysis = analyze({
  factors: [...'ABCD'].map((letter) => ({ letter, kind: 'number' as const })),
  runs: (eightPlots?.runs ?? []).map((run, index) => ({ ...run, y: Math.sin(7 * index) + (run.x[0] ?? 0) })),
});

describe('effects judged together over strata', () => {
  it('are a family in each stratum, and the strata hold the promise together', () => {
    const whole = analysis.terms.filter(({ stratum }) => stratum === 'whole');
    expect(whole.map(({ term }) => term)).toEqual(['A', 'BC', 'BD', 'CD']);
    for (const { t, df, pFamily } of whole) {
      const withinStratum = studentizedMaximumModulusUpperTail(Math.abs(t ?? 0), whole.length, df ?? 0);
      expect(pFamily).toBeCloseTo(1 - (1 - withinStratum) ** 2, 12);
    }
  });

  it('never look surer together than alone', () => {
    for (const { p, pFamily } of analysis.terms) expect(pFamily ?? 0).toBeGreaterThanOrEqual(p ?? 1);
  });
});
