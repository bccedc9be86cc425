import { noncentralityForPower, powerBeyond } from '../distributions/power-of-two-sided-t.ts';
import { studentTUpperQuantile } from '../distributions/student-t.ts';
import { studentizedMaximumModulusQuantile } from '../distributions/studentized-maximum-modulus.ts';
import { assumeActive } from '../tables/assumed-active.ts';
import { pseudoErrorPower, pseudoErrorSizeForPower } from '../tables/pseudo-error-power.ts';
import type { FamilySize } from './family-sizes.ts';
import type { ErrorPlan } from './proposal.ts';

const alpha = 0.05;
const promisedPower = 0.8;

/** What an error estimate lets one see, with all sizes in standard errors of the effect. */
export interface Judging {
  /** Size at which *likely* is said 8 times in 10. */
  likelySize: number;
  /** The same for *clear*. */
  clearSize: number;
  /** How many effects may be active at most for this to hold. */
  assumedActive: number;
  /** Probability of *likely* at a size. */
  power: (size: number) => number;
}

/** An error estimate pooled from units of unequal variance, as whole plots of corners and of fewer middle runs are. */
export interface MixedError {
  /** What the estimate is on average, over the variance that the effect itself has. */
  excess: number;
  /** Degrees of freedom that give the spread of the estimate (Satterthwaite 1946); the limits stay those of the plain count. */
  df: number;
}

/**
 * A family of effects judged on an error with its own degrees of freedom: exact, however many of them are active. Where strata share the promise about
 * any effect, each is held to its share of alpha, as in the analysis. Sizes are in standard errors that the effect has, not in estimated ones.
 */
export function judgeByDegrees(
  df: number,
  { tests, strata }: FamilySize,
  mixed: MixedError = { excess: 1, df },
): Judging {
  const stretch = Math.sqrt(mixed.excess);
  const share = -Math.expm1(Math.log1p(-alpha) / strata);
  const limit = stretch * remember(`t ${df}`, () => studentTUpperQuantile(alpha / 2, df));
  const familyLimit =
    stretch *
    remember(`m ${df} ${tests} ${strata}`, () => studentizedMaximumModulusQuantile(share, tests, df));
  const sizeAt = (asked: number) =>
    remember(`s ${mixed.df} ${asked}`, () => noncentralityForPower(promisedPower, mixed.df, asked));
  return {
    likelySize: sizeAt(limit),
    clearSize: sizeAt(familyLimit),
    assumedActive: tests,
    power: (size) => powerBeyond(size, mixed.df, limit),
  };
}

/** Effects judged on pseudo error, by the simulated tables. */
export function judgeByPseudoError({
  contrasts,
  replicateDf,
}: Pick<ErrorPlan, 'contrasts' | 'replicateDf'>): Judging {
  const plan = { contrasts, replicateDf };
  return {
    likelySize: pseudoErrorSizeForPower(plan, 'likely', promisedPower),
    clearSize: pseudoErrorSizeForPower(plan, 'clear', promisedPower),
    assumedActive: assumeActive(contrasts),
    power: (size) => pseudoErrorPower(plan, 'likely', size),
  };
}

// The few combinations of df and family size that plans have, solved once a process: a slider asks for them many times a second.
const known = new Map<string, number>();

function remember(key: string, solve: () => number): number {
  const value = known.get(key) ?? solve();
  known.set(key, value);
  return value;
}
