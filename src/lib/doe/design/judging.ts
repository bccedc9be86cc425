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

/**
 * A family of effects judged on an error with its own degrees of freedom: exact, however many of them are active. Where strata share the promise about
 * any effect, each is held to its share of alpha, as in the analysis.
 */
export function judgeByDegrees(df: number, { tests, strata }: FamilySize): Judging {
  const limit = remember(`t ${df}`, () => studentTUpperQuantile(alpha / 2, df));
  const share = -Math.expm1(Math.log1p(-alpha) / strata);
  const familyLimit = remember(`m ${df} ${tests} ${strata}`, () =>
    studentizedMaximumModulusQuantile(share, tests, df),
  );
  return {
    likelySize: remember(`t80 ${df}`, () => noncentralityForPower(promisedPower, df, limit)),
    clearSize: remember(`m80 ${df} ${tests} ${strata}`, () =>
      noncentralityForPower(promisedPower, df, familyLimit),
    ),
    assumedActive: tests,
    power: (size) => powerBeyond(size, df, limit),
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
