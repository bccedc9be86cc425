import type { FamilySize } from '../design/family-sizes.ts';
import { normalUpperTail } from '../distributions/normal.ts';
import { normalQuantile } from '../distributions/normal-quantile.ts';
import { studentTTwoSided, studentTUpperQuantile } from '../distributions/student-t.ts';
import { studentizedMaximumModulusUpperTail } from '../distributions/studentized-maximum-modulus.ts';
import {
  type PseudoErrorPlan,
  type PseudoErrorStatistic,
  pseudoErrorLimit,
  pseudoErrorUpperTail,
} from '../tables/pseudo-error-limits.ts';
import type { Tested } from './analysis.ts';

/** What an estimate is held against. Each kind knows its own tails. */
export type Yardstick =
  /** No error at all, or no spread in it. */
  | { kind: 'none' }
  /** A standard deviation with degrees of freedom. */
  | { kind: 't'; sd: number; df: number; family: Family }
  /** The typical contrast: `sd` is the error of a run according to the contrasts that count for this estimate. */
  | { kind: 'pseudo'; sd: number; plan: PseudoErrorPlan; outside: boolean; family: Family }
  /** A variance known by theory: never judged together, as the theory is only a floor. */
  | { kind: 'known'; sd: number };

/** Effects judged together because they share one error estimate. */
export interface Family extends FamilySize {
  hasCurvature: boolean;
}

const UNTESTED: Tested = { se: null, df: null, t: null, p: null, pFamily: null, ci: null };

/**
 * Tests an estimate.
 *
 * @param variance of the estimate for error variance 1
 * @param alpha one minus the confidence of the interval
 */
export function testEstimate(
  estimate: number,
  variance: number,
  yardstick: Yardstick,
  alpha: number,
): Tested {
  if (yardstick.kind === 'none') return UNTESTED;
  const se = yardstick.sd * Math.sqrt(variance);
  const df = yardstick.kind === 't' ? yardstick.df : null;
  if (!(se > 0)) return { ...UNTESTED, se: 0, df };
  const t = estimate / se;
  const halfWidth = limitOf(yardstick, alpha) * se;
  return { se, df, t, ...tailsOf(yardstick, Math.abs(t)), ci: [estimate - halfWidth, estimate + halfWidth] };
}

/** Half-width of the interval in standard errors. */
export function limitOf(yardstick: Exclude<Yardstick, { kind: 'none' }>, alpha: number): number {
  if (yardstick.kind === 't') return studentTLimit(yardstick.df, alpha);
  if (yardstick.kind === 'known') return normalQuantile(1 - alpha / 2);
  const { plan, outside } = yardstick;
  const statistic: PseudoErrorStatistic = outside ? 'outside' : 'single';
  const key = `${statistic} ${plan.contrasts} ${plan.replicateDf}`;
  return rememberedLimit(key, alpha, (upper) => pseudoErrorLimit(plan, statistic, upper));
}

/** The t quantile that cuts off `alpha` in both tails together. */
export function studentTLimit(df: number, alpha: number): number {
  return rememberedLimit(`t ${df}`, alpha, (both) => studentTUpperQuantile(both / 2, df));
}

function tailsOf(
  yardstick: Exclude<Yardstick, { kind: 'none' }>,
  size: number,
): { p: number; pFamily: number | null } {
  if (yardstick.kind === 'known') return { p: 2 * normalUpperTail(size), pFamily: null };
  const { family } = yardstick;
  if (yardstick.kind === 't') {
    const p = studentTTwoSided(size, yardstick.df);
    return {
      p,
      pFamily: overStrata(studentizedMaximumModulusUpperTail(size, family.tests, yardstick.df), p, family),
    };
  }
  const { plan, outside } = yardstick;
  const p = pseudoErrorUpperTail(plan, outside ? 'outside' : 'single', size);
  const pFamily = pseudoErrorUpperTail(plan, family.hasCurvature ? 'familyAndOutside' : 'family', size);
  return { p, pFamily: overStrata(pFamily, p, family) };
}

/**
 * From judged together within a stratum to judged together within the result.
 *
 * Errors of strata are independent, each with its own degrees of freedom, so one maximum over all terms has no tail of its own. The largest ratio of
 * each stratum has one: if each of S strata is held to a tail p with 1 - (1 - p)^S = alpha, the chance that none is passed is (1 - p)^S = 1 - alpha.
 */
function overStrata(withinStratum: number, p: number, { strata }: Family): number {
  const together = -Math.expm1(strata * Math.log1p(-Math.min(1, withinStratum)));
  return Math.min(1, Math.max(p, together));
}

// Quantiles cost a hundred times what the rest of a test does, and a few of them serve all trials.
const limits = new Map<string, number>();

function rememberedLimit(key: string, alpha: number, compute: (alpha: number) => number): number {
  const full = `${key} ${alpha}`;
  const known = limits.get(full);
  if (known !== undefined) return known;
  const limit = compute(alpha);
  if (limits.size > 1000) limits.clear();
  limits.set(full, limit);
  return limit;
}
