import { powerBeyond } from '../distributions/power-of-two-sided-t.ts';
import { studentTUpperQuantile } from '../distributions/student-t.ts';
import { studentizedMaximumModulusQuantile } from '../distributions/studentized-maximum-modulus.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { factorModel } from '../linear-algebra/least-squares.ts';
import { hasPseudoErrorPower, pseudoErrorPower } from '../tables/pseudo-error-power.ts';
import type { Proposal } from './proposal.ts';
import { letterAt } from './words.ts';

/** How often a change of this size is called *likely*, and *clear*, in run-to-run standard deviations. */
export interface PowerAtSize {
  size: number;
  likely: number;
  clear: number;
}

const alpha = 0.05;
const sizes = [0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4];

/**
 * Power for the least well known main effect of a setting that is easy to change: exact non-central t where the error has degrees of freedom, the
 * simulated table for pseudo error. null where the plan has no error to judge such an effect by.
 */
export function powerCurve(
  proposal: Pick<Proposal, 'k' | 'layout' | 'terms' | 'errorPlan'>,
): PowerAtSize[] | null {
  const { errorPlan, layout, terms } = proposal;
  const error = errorPlan.strata ? errorPlan.strata.find(({ name }) => name === 'sub') : errorPlan;
  const variance = worstVariance(proposal);
  if (error === undefined || error.rung === 'none' || variance === null) return null;
  const standardError = Math.sqrt(variance);
  const tested = terms.length + (layout.some(({ center }) => center) ? 1 : 0);
  const { df } = error;
  if (df !== null) {
    const alone = studentTUpperQuantile(alpha / 2, df);
    const together = studentizedMaximumModulusQuantile(alpha, tested, df);
    return sizes.map((size) => ({
      size,
      likely: powerBeyond(size / standardError, df, alone),
      clear: powerBeyond(size / standardError, df, together),
    }));
  }
  const plan = { contrasts: errorPlan.contrasts, replicateDf: errorPlan.replicateDf };
  if (errorPlan.strata || !hasPseudoErrorPower(plan)) return null;
  return sizes.map((size) => ({
    size,
    likely: pseudoErrorPower(plan, 'likely', size / standardError),
    clear: pseudoErrorPower(plan, 'clear', size / standardError),
  }));
}

/** Of a main effect, for a run variance of 1; settings that stay the same within every whole plot are left aside. */
function worstVariance({ k, layout, terms }: Pick<Proposal, 'k' | 'layout' | 'terms'>): number | null {
  const letters = Array.from({ length: k }, (_, place) => letterAt(place));
  const ones = layout.map(() => 1);
  const space = createColumnSpace([ones]);
  const columns: number[][] = [ones];
  const places = new Map<string, number>();
  const enter = (column: number[]) => space.add(column) && columns.push(column) > 0;
  for (const block of new Set(layout.map(({ block: each }) => each)))
    enter(layout.map((row) => (row.block === block ? 1 : 0)));
  enter(layout.map(({ center }) => (center ? 1 : 0)));
  for (const term of terms) {
    const column = layout.map(({ x }) =>
      [...term].reduce((product, letter) => product * (x[letters.indexOf(letter)] ?? 0), 1),
    );
    if (enter(column)) places.set(term, columns.length - 1);
  }
  const isEasy = (letter: string) => {
    const at = letters.indexOf(letter);
    const levels = new Map<number, Set<number>>();
    for (const { wholePlot, x } of layout) {
      if (wholePlot === undefined) return true;
      levels.set(wholePlot, (levels.get(wholePlot) ?? new Set()).add(x[at] ?? 0));
    }
    return [...levels.values()].some((different) => different.size > 1);
  };
  const { variances } = factorModel(columns);
  const found = letters.flatMap((letter) => {
    const place = places.get(letter);
    return place !== undefined && isEasy(letter) ? [4 * (variances[place] ?? 0)] : [];
  });
  return found.length > 0 ? Math.max(...found) : null;
}
