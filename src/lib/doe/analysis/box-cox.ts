import { chiSquareQuantile } from '../distributions/chi-square.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import type { AnalysisInput } from './analysis.ts';
import { selectMeasuredRuns } from './measured-runs.ts';
import { layOutModel } from './model-layout.ts';
import { listTerms } from './terms.ts';

export interface BoxCox {
  /** The power at which the residuals are smallest: 1 as it is, 0 the logarithm. */
  lambda: number;
  /** Powers that the readings do not contradict at the 5 % level. */
  interval: [number, number];
  residualDf: number;
}

const LOWEST = -3;
const HIGHEST = 3;

/**
 * The power transformation under which the model fits best (G. E. P. Box & D. R. Cox, 1964, JRSS B 26, 211-252): profile likelihood of
 * (y^lambda - 1) / lambda scaled by the geometric mean, interval by likelihood ratio. null for readings of zero or less and where the model leaves no
 * residual.
 */
export function fitBoxCox(input: AnalysisInput): BoxCox | null {
  const { runs, layout } = selectMeasuredRuns({ ...input, scale: 'raw' });
  if (runs.some((run) => run.y <= 0)) return null;
  const hasMiddles = runs.some((run) => run.center) && runs.some((run) => !run.center);
  const { model, columns } = layOutModel({
    layout,
    terms: input.terms ?? listTerms(layout.letters, 2),
    curvature: input.curvatureTerm ?? hasMiddles,
    withAliases: false,
  });
  const { residualDf } = model;
  if (residualDf < 1) return null;
  const space = createColumnSpace(columns);
  const logs = runs.map((run) => Math.log(run.y));
  const meanLog = logs.reduce((sum, value) => sum + value, 0) / logs.length;
  // Around the geometric mean, so that neither big readings nor powers near zero cost digits.
  const centered = logs.map((value) => value - meanLog);
  const logSs = (lambda: number) =>
    Math.log(
      space.squaredDistance(
        centered.map((value) => (Math.abs(lambda) < 1e-9 ? value : Math.expm1(lambda * value) / lambda)),
      ),
    );
  const lambda = minimize(logSs);
  const most = logSs(lambda) + chiSquareQuantile(0.95, 1) / runs.length;
  if (!Number.isFinite(most)) return null;
  const crossing = (end: number) => bisect((at) => logSs(at) - most, lambda, end);
  return { lambda, interval: [crossing(LOWEST), crossing(HIGHEST)], residualDf };
}

/**
 * Whether another power is worth naming: its interval excludes 1, readings spread over more than a factor of three, and the model leaves at least
 * four degrees of freedom.
 */
export function suggestsOtherScale(input: AnalysisInput, found: BoxCox): boolean {
  const readings = input.runs.flatMap((run) => (run.y === null ? [] : [run.y]));
  const wide = Math.max(...readings) / Math.min(...readings) > 3;
  return wide && found.residualDf >= 4 && (found.interval[0] > 1 || found.interval[1] < 1);
}

function minimize(f: (at: number) => number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [LOWEST, HIGHEST];
  let [left, right] = [high - golden * (high - low), low + golden * (high - low)];
  let [atLeft, atRight] = [f(left), f(right)];
  while (high - low > 1e-8) {
    if (atLeft < atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - golden * (high - low);
      atLeft = f(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + golden * (high - low);
      atRight = f(right);
    }
  }
  return (low + high) / 2;
}

/** Where f, below zero at `inside`, crosses zero on the way to `end`; `end` if it does not. */
function bisect(f: (at: number) => number, inside: number, end: number): number {
  if (f(end) <= 0) return end;
  let [below, above] = [inside, end];
  for (let halving = 0; halving < 60; halving++) {
    const middle = (below + above) / 2;
    if (f(middle) <= 0) below = middle;
    else above = middle;
  }
  return (below + above) / 2;
}
