import type { Analysis, AnalysisInput, LenthLimits } from './analysis.ts';
import { estimateCornerContrasts } from './corner-contrasts.ts';
import { selectMeasuredRuns } from './measured-runs.ts';
import { halfNormalScores } from './plot-scores.ts';

/** One effect on the half-normal plot. */
export interface PlottedEffect {
  term: string;
  effect: number;
  /** Its size, signs left aside: the height of its mark. */
  size: number;
  score: number;
  /** Half-width of its own interval, the limit that decides; null where it is not tested: it went to error, or there is none. */
  limit: number | null;
  p: number | null;
  pFamily: number | null;
}

export interface EffectPlot {
  /** Smallest first. */
  effects: PlottedEffect[];
  lenth: LenthLimits | null;
  /** What the calls rest on: the limits of this plot, or nothing. Lenth's own limits never decide. */
  decided: Analysis['error']['source'];
}

/**
 * The half-normal plot (C. Daniel 1959, Technometrics 1, 311-341): every contrast of the corner runs where the plan is regular and complete, those
 * that went to error too; else the terms of the model.
 */
export function plotEffects(input: AnalysisInput, analysis: Analysis): EffectPlot {
  const { runs, layout } = selectMeasuredRuns(input);
  const contrasts = estimateCornerContrasts({ layout, y: runs.map(({ y }) => y) });
  const tested = new Map(analysis.terms.map((term) => [term.term, term]));
  const listed = contrasts
    ? contrasts.terms.map((term, place) => ({ term, effect: contrasts.effects[place] ?? 0 }))
    : analysis.terms.map(({ term, effect }) => ({ term, effect }));
  const scores = halfNormalScores(listed.map(({ effect }) => effect));
  const effects = listed.map(({ term, effect }, place): PlottedEffect => {
    const estimate = tested.get(term);
    const ci = estimate?.ci ?? null;
    return {
      term,
      effect,
      size: Math.abs(effect),
      score: scores[place] ?? 0,
      limit: ci === null ? null : (ci[1] - ci[0]) / 2,
      p: estimate?.p ?? null,
      pFamily: estimate?.pFamily ?? null,
    };
  });
  return {
    effects: effects.sort((first, second) => first.score - second.score),
    lenth: analysis.lenth ?? null,
    decided: analysis.error.source,
  };
}
