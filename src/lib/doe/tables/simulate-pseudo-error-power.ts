import { estimatePseudoErrors } from '../analysis/pseudo-error.ts';
import { normalUpperTail } from '../distributions/normal.ts';
import { createNormalSource } from '../random/normal-numbers.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { assumeActive } from './assumed-active.ts';
import { type PseudoErrorPlan, pseudoErrorLimit } from './pseudo-error-limits.ts';

/** True sizes, in standard errors of a contrast, at which power is tabulated. */
export const SIZES: readonly number[] = [
  ...Array.from({ length: 25 }, (_, index) => index / 2),
  14,
  16,
  20,
  24,
  32,
  48,
  64,
  96,
  128,
];

/**
 * Probability that one active contrast is called *likely*, and *clear*, at each of `SIZES`, when `assumeActive` contrasts are active at that size.
 *
 * A contrast is independent of the pseudo error that leaves it out, so each draw contributes its exact normal probability instead of a yes or no.
 */
export function simulatePseudoErrorPower(plan: PseudoErrorPlan & { draws: number; seed: number }): {
  likely: number[];
  clear: number[];
} {
  const normal = createNormalSource(createUniformSource(plan.seed));
  // With repeats there are middle runs, and then the bend is one of the family.
  const family = plan.replicateDf > 0 ? 'familyAndOutside' : 'family';
  const limits = [pseudoErrorLimit(plan, 'single', 0.05), pseudoErrorLimit(plan, family, 0.05)];
  const sums = limits.map(() => new Float64Array(SIZES.length));
  for (let draw = 0; draw < plan.draws; draw++) {
    const noise = Array.from({ length: plan.contrasts }, normal);
    const squares = Array.from({ length: plan.replicateDf }, () => normal() ** 2);
    const replicateError = Math.sqrt(
      squares.reduce((sum, square) => sum + square, 0) / Math.max(1, plan.replicateDf),
    );
    SIZES.forEach((size, place) => {
      const contrasts = noise.map((value, index) =>
        index < assumeActive(plan.contrasts) ? value + size : value,
      );
      const { leaveOneOut } = estimatePseudoErrors({
        contrasts,
        replicateError,
        replicateDf: plan.replicateDf,
      });
      const error = leaveOneOut[0] ?? 0;
      limits.forEach((limit, which) => {
        const sum = sums[which];
        const caught = normalUpperTail(limit * error - size) + normalUpperTail(limit * error + size);
        if (sum) sum[place] = (sum[place] ?? 0) + caught;
      });
    });
  }
  const [likely = [], clear = []] = sums.map((sum) =>
    Array.from(sum, (total) => Number((total / plan.draws).toPrecision(6))),
  );
  return { likely, clear };
}
