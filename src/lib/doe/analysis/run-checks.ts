import type { Analysis, AnalysisInput } from './analysis.ts';
import { normalScores } from './plot-scores.ts';

/** One run against the model; figures are on the scale of the analysis. */
export interface RunCheck {
  /** Its place among the input's runs. */
  place: number;
  /** Its turn; its place from 1 where no order is known. */
  order: number;
  x: readonly number[];
  y: number;
  fitted: number;
  residual: number;
  leverage: number;
  studentizedInternal: number | null;
  studentizedExternal: number | null;
  cooks: number | null;
  /** What a residual of its rank would be if all were normal. */
  score: number;
}

/** The runs that were analyzed with all that tells how well the model agrees with them. */
export function listRunChecks(input: AnalysisInput, analysis: Analysis): RunCheck[] {
  const scores = normalScores(analysis.residuals);
  return analysis.used.map((place, row) => {
    const run = input.runs[place];
    const [fitted, residual] = [analysis.fitted[row] ?? 0, analysis.residuals[row] ?? 0];
    return {
      place,
      order: run?.order ?? place + 1,
      x: run?.x ?? [],
      y: fitted + residual,
      fitted,
      residual,
      leverage: analysis.leverage[row] ?? 1,
      studentizedInternal: analysis.studentizedInternal[row] ?? null,
      studentizedExternal: analysis.studentizedExternal[row] ?? null,
      cooks: analysis.cooks[row] ?? null,
      score: scores[row] ?? 0,
    };
  });
}
