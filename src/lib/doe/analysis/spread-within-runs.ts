import type { AnalysisRun } from './analysis.ts';

/** Pooled spread between parts of one run. */
export interface SpreadWithinRuns {
  sd: number;
  df: number;
  /** Harmonic mean of the number of parts. */
  parts: number;
}

/** Standard deviation between parts made at one setting of the dials, pooled over runs; null without repeated parts. Parts made in a row show short-term spread only. */
export function spreadWithinRuns(runs: readonly AnalysisRun[]): SpreadWithinRuns | null {
  let ss = 0;
  let df = 0;
  let reciprocals = 0;
  let counted = 0;
  for (const { parts } of runs) {
    if (parts === undefined || parts.length < 2) continue;
    const mean = parts.reduce((sum, part) => sum + part, 0) / parts.length;
    ss += parts.reduce((sum, part) => sum + (part - mean) ** 2, 0);
    df += parts.length - 1;
    reciprocals += 1 / parts.length;
    counted++;
  }
  return df === 0 ? null : { sd: Math.sqrt(ss / df), df, parts: counted / reciprocals };
}
