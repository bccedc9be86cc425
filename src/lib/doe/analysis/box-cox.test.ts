import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { factorialExamples, toAnalysisInput } from '../../../../tests/builders/reference-examples.ts';
import { fitBoxCox, suggestsOtherScale } from './box-cox.ts';

const foundSchema = z.object({
  terms: z.array(z.string()),
  lambdaHat: z.number(),
  ci95: z.array(z.number()),
});

// Computed with R 4.2.2; the maximum is flat, so lambda is good to about 1e-6.
const cases = factorialExamples.flatMap((example) =>
  ['boxcox', 'boxcoxBCD_BC_BD'].flatMap((name) => {
    const found = foundSchema.safeParse(example.computed[name]);
    return found.success ? [{ example, name, wanted: found.data }] : [];
  }),
);

describe('fitBoxCox', () => {
  it.each(cases)('$example.id, $name', ({ example, wanted }) => {
    const input = toAnalysisInput(example, { terms: wanted.terms, curvatureTerm: false });
    const found = fitBoxCox(input);
    expect(found?.lambda).toBeCloseTo(wanted.lambdaHat, 5);
    expect(found?.interval[0]).toBeCloseTo(wanted.ci95[0] ?? Number.NaN, 5);
    expect(found?.interval[1]).toBeCloseTo(wanted.ci95[1] ?? Number.NaN, 5);
    if (found) expect(suggestsOtherScale(input, found)).toBe(true);
  });

  it('covers the three published models', () => expect(cases).toHaveLength(3));

  it('says nothing of readings of zero or less, nor of saturated models', () => {
    const factors = [{ letter: 'A', kind: 'number' as const }];
    expect(fitBoxCox({ factors, runs: [-1, 1, -1, 1].map((x, y) => ({ x: [x], y })) })).toBeNull();
    expect(fitBoxCox({ factors, runs: [-1, 1].map((x) => ({ x: [x], y: 2 + x })) })).toBeNull();
  });
});
