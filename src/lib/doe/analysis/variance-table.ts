import { fUpperTail } from '../distributions/f.ts';
import type { AnovaRow } from './analysis.ts';
import { aroundColumns, type Spread } from './error-spread.ts';
import type { Layout } from './layout.ts';
import type { ModelLayout } from './model-layout.ts';

/** The analysis of variance and the figures that follow from it. */
export interface VarianceTable {
  rows: AnovaRow[];
  lackOfFit?: { df: number; ss: number; f: number; p: number };
  r2: number;
  r2Adjusted: number;
  totalSs: number;
}

export interface VarianceQuestion {
  layout: Layout;
  model: ModelLayout;
  y: readonly number[];
  residual: Spread;
  pureError: Spread;
  /** Sum of squares of curvature when it enters last; null: not in the model. */
  curvatureSs: number | null;
  /** The mean square that rows are tested against; null: none. */
  error: { ms: number; df: number } | null;
}

/** Sums of squares by source: blocks, model and curvature each as what is lost when it alone is left out. */
export function tabulateVariance(question: VarianceQuestion): VarianceTable {
  const { layout, model, y, residual, pureError, curvatureSs, error } = question;
  const { columns, blockColumns, terms } = model;
  const named = `${blockColumns} ${model.hasCurvature} ${terms.join(' ')}`;
  const withoutColumns = (from: number, count: number) =>
    aroundColumns(layout, `${named} without ${from} to ${from + count}`, () =>
      columns.filter((_, at) => at > 0 && (at < from || at >= from + count)),
    )(y);
  const total = aroundColumns(layout, 'nothing', () => [])(y);

  const tested = (source: AnovaRow['source'], df: number, ss: number): AnovaRow => {
    const ms = df > 0 ? ss / df : null;
    const f = ms !== null && error !== null && error.ms > 0 ? ms / error.ms : null;
    return { source, df, ss, ms, f, p: f === null || error === null ? null : fUpperTail(f, df, error.df) };
  };
  const untested = (source: AnovaRow['source'], { df, ss }: Spread): AnovaRow => ({
    source,
    df,
    ss,
    ms: df > 0 ? ss / df : null,
    f: null,
    p: null,
  });
  const lostWithout = (from: number, count: number) =>
    Math.max(0, withoutColumns(from, count).ss - residual.ss);

  const rows: AnovaRow[] = [];
  if (blockColumns > 0) rows.push(tested('blocks', blockColumns, lostWithout(1, blockColumns)));
  if (terms.length > 0) {
    const from = columns.length - terms.length;
    rows.push(tested('model', terms.length, lostWithout(from, terms.length)));
  }
  if (curvatureSs !== null) rows.push(tested('curvature', 1, curvatureSs));
  rows.push(untested('residual', residual));
  const fit = splitResidual(residual, pureError);
  if (fit !== null) rows.push(fit.row);
  if (pureError.df > 0) rows.push(untested('pureError', pureError));
  rows.push(untested('total', total));

  const r2 = total.ss > 0 ? 1 - residual.ss / total.ss : 0;
  const adjustable = residual.df > 0 && total.ss > 0;
  return {
    rows,
    ...(fit?.tested && { lackOfFit: fit.tested }),
    r2,
    r2Adjusted: adjustable ? 1 - ((1 - r2) * total.df) / residual.df : r2,
    totalSs: total.ss,
  };
}

/** Lack of fit against pure error; null when repeats leave nothing of the residual. */
function splitResidual(residual: Spread, pureError: Spread) {
  const df = residual.df - pureError.df;
  if (df <= 0 || pureError.df === 0) return null;
  const ss = Math.max(0, residual.ss - pureError.ss);
  const ms = ss / df;
  const pureMs = pureError.ss / pureError.df;
  const f = pureMs > 0 ? ms / pureMs : null;
  const p = f === null ? null : fUpperTail(f, df, pureError.df);
  const row: AnovaRow = { source: 'lackOfFit', df, ss, ms, f, p };
  return { row, tested: f === null || p === null ? null : { df, ss, f, p } };
}
