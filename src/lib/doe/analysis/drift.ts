import { studentTUpperQuantile } from '../distributions/student-t.ts';
import type { Analysis, AnalysisInput } from './analysis.ts';
import { selectMeasuredRuns } from './measured-runs.ts';
import { layOutModel } from './model-layout.ts';
import { listTerms } from './terms.ts';

/** A steady change of the result over the run order. */
export interface Drift {
  /** From the first run to the last, on the scale of the analysis. */
  change: number;
  interval: [number, number];
}

/** Share of the run order that the settings may explain before drift cannot be told from their effects. */
const MOST_EXPLAINED = 0.9;

/**
 * Slope over the run order beside all estimated effects, judged by the error of the plan without what the slope itself takes from it; null where
 * order is not known, is explained by the settings, or fewer than two degrees of freedom are left.
 */
export function estimateDrift(input: AnalysisInput, analysis: Analysis): Drift | null {
  const { runs, layout } = selectMeasuredRuns(input);
  const { weights } = layout;
  const orders = runs.map((run) => input.runs[run.index]?.order);
  if (orders.some((order) => order === undefined)) return null;
  const { df, sd, strata } = analysis.error;
  if (df === null || sd === null || df < 3 || strata !== undefined) return null;
  const known = orders.map((order) => order ?? 0);
  const span = Math.max(...known) - Math.min(...known);
  if (span === 0) return null;
  const { model } = layOutModel({
    layout,
    terms: listTerms(layout.letters, 2),
    curvature: analysis.curvature !== undefined,
    withAliases: false,
  });
  const share = known.map((order) => order / span);
  const rest = model.fit(share).residuals;
  const dot = (first: readonly number[], second: readonly number[]) =>
    first.reduce((sum, value, row) => sum + value * (second[row] ?? 0) * (weights?.[row] ?? 1), 0);
  const left = dot(rest, rest);
  const mean = share.reduce((sum, value) => sum + value, 0) / share.length;
  const whole = share.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  if (left < (1 - MOST_EXPLAINED) * whole) return null;
  const residuals = model.fit(runs.map((run) => run.y)).residuals;
  const change = dot(rest, residuals) / left;
  const ss = Math.max(0, df * sd * sd - change * change * left);
  const halfWidth = studentTUpperQuantile(0.025, df - 1) * Math.sqrt(ss / (df - 1) / left);
  return { change, interval: [change - halfWidth, change + halfWidth] };
}
