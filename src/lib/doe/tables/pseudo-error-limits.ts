import table from './pseudo-error-limits.json' with { type: 'json' };

/** The four tabulated statistics; see `simulate-pseudo-error.ts`. */
export type PseudoErrorStatistic = 'single' | 'outside' | 'family' | 'familyAndOutside';

/** A plan as the table knows it. */
export interface PseudoErrorPlan {
  contrasts: number;
  replicateDf: number;
}

const rows = new Map(table.rows.map((row) => [`${row.contrasts}:${row.replicateDf}`, row]));

/** Whether pseudo error has limits for such a plan: 7 to 15 contrasts and at most two degrees of freedom of pure error. */
export function hasPseudoErrorLimits({ contrasts, replicateDf }: PseudoErrorPlan): boolean {
  return rows.has(`${contrasts}:${replicateDf}`);
}

/**
 * Probability that a statistic on pseudo error is at least `t` when nothing is active, from the simulated tails.
 *
 * @throws RangeError for plans without limits.
 */
export function pseudoErrorUpperTail(
  plan: PseudoErrorPlan,
  statistic: PseudoErrorStatistic,
  t: number,
): number {
  const tail = tailOf(plan, statistic);
  if (!(t > 0)) return 1;
  const place = (Math.log(t) - table.grid.start) / table.grid.step;
  // Below the grid the probability falls in a straight line from 1 at t = 0.
  if (place <= 0) return 1 - ((1 - Math.exp(tail[0] ?? 0)) * t) / Math.exp(table.grid.start);
  return Math.exp(cubicThrough(tail, place));
}

/** The limit that the statistic reaches with probability `upper` when nothing is active. */
export function pseudoErrorLimit(
  plan: PseudoErrorPlan,
  statistic: PseudoErrorStatistic,
  upper: number,
): number {
  if (!(upper > 0 && upper < 1))
    throw new RangeError(`pseudoErrorLimit: upper must be between 0 and 1, got ${upper}`);
  let low = -20;
  let high = 40;
  for (let halving = 0; halving < 60; halving++) {
    const middle = (low + high) / 2;
    if (pseudoErrorUpperTail(plan, statistic, Math.exp(middle)) > upper) low = middle;
    else high = middle;
  }
  return Math.exp((low + high) / 2);
}

function tailOf(plan: PseudoErrorPlan, statistic: PseudoErrorStatistic): readonly number[] {
  const row = rows.get(`${plan.contrasts}:${plan.replicateDf}`);
  if (row === undefined)
    throw new RangeError(
      `pseudoErrorUpperTail: plan has no limits: ${plan.contrasts} contrasts, ${plan.replicateDf} replicate df`,
    );
  return row[statistic];
}

/** Cubic through the four nearest points of the grid; beyond its end the straight line of the last two, as tails of such ratios are powers of t. */
function cubicThrough(values: readonly number[], place: number): number {
  const last = values.length - 1;
  const at = (index: number) => values[Math.max(0, Math.min(last, index))] ?? 0;
  if (place >= last) return at(last) + (at(last) - at(last - 1)) * (place - last);
  const start = Math.max(0, Math.min(last - 3, Math.floor(place) - 1));
  const x = place - start;
  return (
    (-at(start) * (x - 1) * (x - 2) * (x - 3)) / 6 +
    (at(start + 1) * x * (x - 2) * (x - 3)) / 2 -
    (at(start + 2) * x * (x - 1) * (x - 3)) / 2 +
    (at(start + 3) * x * (x - 1) * (x - 2)) / 6
  );
}

/** The table's row for such a plan, for whoever works its limits out anew: ln of the tail at t = exp(start + index x step). */
export function listPseudoErrorTails(plan: PseudoErrorPlan): {
  start: number;
  step: number;
  tails: Record<PseudoErrorStatistic, readonly number[]>;
} | null {
  const row = rows.get(`${plan.contrasts}:${plan.replicateDf}`);
  if (row === undefined) return null;
  const { single, outside, family, familyAndOutside } = row;
  const { start, step } = table.grid;
  return { start, step, tails: { single, outside, family, familyAndOutside } };
}
