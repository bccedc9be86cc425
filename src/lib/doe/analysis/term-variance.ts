import type { Analysis } from './analysis.ts';

/** The line of one term in the analysis of variance: what is lost when it alone is left out. */
export interface TermVariance {
  term: string;
  df: 1;
  ss: number;
  ms: number;
  /** The square of the term's t, so both always agree; null without an error. */
  f: number | null;
  p: number | null;
  stratum?: 'whole' | 'sub';
}

/** The analysis of variance term by term, each against the error that its effect is judged by. */
export function listTermVariances({ terms }: Pick<Analysis, 'terms'>): TermVariance[] {
  return terms.map(({ term, ss, t, p, stratum }) => ({
    term,
    df: 1,
    ss,
    ms: ss,
    f: t === null ? null : t * t,
    p,
    ...(stratum && { stratum }),
  }));
}
