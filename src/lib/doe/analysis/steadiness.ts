import { type Analysis, AnalysisError, type AnalysisInput } from './analysis.ts';
import { analyze } from './analyze.ts';

/** Fewest parts a run from which the spread between them is worth analyzing. */
const ENOUGH_PARTS = 5;

/**
 * The spread between parts as a result of its own: ln(s) of each run (M. S. Bartlett & D. G. Kendall, 1946, JRSS Suppl. 8, 128-138), with the variance
 * that theory gives it as a floor. A coarse gauge adds its own spread, so that s = 0 stands for something. null with fewer than five parts a run.
 *
 * @param resolution smallest step of the gauge, 0 if not known
 */
export function analyzeSteadiness(input: AnalysisInput, resolution: number): Analysis | null {
  const runs = input.runs.map((run) => ({ ...run, y: logSpread(run.parts ?? [], resolution) }));
  const counts = input.runs.flatMap((run) =>
    run.parts !== undefined && run.y !== null ? [run.parts.length] : [],
  );
  if (counts.length === 0 || Math.min(...counts) < ENOUGH_PARTS) return null;
  const theory = counts.reduce((sum, parts) => sum + varianceOfLogSpread(parts), 0) / counts.length;
  try {
    return analyze({ ...input, runs, scale: 'raw', knownVariance: theory });
  } catch (error) {
    if (error instanceof AnalysisError) return null;
    throw error;
  }
}

function logSpread(parts: readonly number[], resolution: number): number | null {
  if (parts.length < ENOUGH_PARTS) return null;
  const mean = parts.reduce((sum, part) => sum + part, 0) / parts.length;
  const variance = parts.reduce((sum, part) => sum + (part - mean) ** 2, 0) / (parts.length - 1);
  const seen = variance + resolution ** 2 / 12;
  return seen > 0 ? Math.log(seen) / 2 : null;
}

/** Variance of ln(s) for m normal parts: a quarter of trigamma((m - 1) / 2). */
export function varianceOfLogSpread(parts: number): number {
  return trigamma((parts - 1) / 2) / 4;
}

/** Second derivative of ln gamma: recurrence up to 10, then the asymptotic series. */
function trigamma(x: number): number {
  let sum = 0;
  let at = x;
  for (; at < 10; at++) sum += 1 / (at * at);
  const inverse = 1 / (at * at);
  const series = inverse * (1 / 6 - inverse * (1 / 30 - inverse * (1 / 42 - inverse / 30)));
  return sum + 1 / at + inverse / 2 + series / at;
}
