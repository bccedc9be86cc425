import type { ErrorPlan, ErrorStratum } from './proposal.ts';

/** Where an effect is judged: within one stratum of whole plots, or with all others where everything is shuffled freely. */
export type JudgedIn = ErrorStratum['name'] | undefined;

export interface FamilySize {
  /** Effects judged together by the same error, at least 1. */
  tests: number;
  /** Strata that share the promise about any of the result's effects, at least 1. */
  strata: number;
}

/**
 * How many effects are judged together: all of the result, or those of each stratum by that stratum's error. Strata that nothing can be judged in take
 * no share of the promise.
 */
export function sizeFamilies(
  places: readonly JudgedIn[],
  { strata }: Pick<ErrorPlan, 'strata'>,
): (stratum: JudgedIn) => FamilySize {
  const isJudged = (stratum: JudgedIn) => strata?.find(({ name }) => name === stratum)?.rung !== 'none';
  const shares = Math.max(1, new Set(places.filter(isJudged)).size);
  return (stratum) => ({
    tests: Math.max(1, places.filter((place) => place === stratum).length),
    strata: shares,
  });
}
