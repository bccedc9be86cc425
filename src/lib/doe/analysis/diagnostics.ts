import type { FactoredModel, LeastSquaresFit } from '../linear-algebra/least-squares.ts';

/** How well single runs agree with the model; null where a run alone determines its fitted value or there is no residual spread. */
export interface Diagnostics {
  press: number | null;
  studentizedInternal: (number | null)[];
  studentizedExternal: (number | null)[];
  cooks: (number | null)[];
}

/**
 * Residuals in units of their own standard error (internally: with the run, externally: without it), Cook's distance and the prediction sum of
 * squares (Cook & Weisberg 1982, Residuals and Influence in Regression, ch. 2), all from the ordinary residual mean square.
 */
export function diagnose(
  model: FactoredModel,
  fit: LeastSquaresFit,
  weights: readonly number[] | undefined,
  negligible: number,
): Diagnostics {
  const df = model.residualDf;
  const sd = df > 0 ? Math.sqrt(fit.residualSs / df) : 0;
  const hasSpread = sd > negligible;
  const rows = fit.residuals.map((residual, row) => {
    const leverage = model.leverage[row] ?? 1;
    const weighted = residual * Math.sqrt(weights?.[row] ?? 1);
    return { leverage, weighted, room: 1 - leverage };
  });
  const internal = rows.map(({ weighted, room }) =>
    hasSpread && room > 0 ? weighted / (sd * Math.sqrt(room)) : null,
  );
  return {
    press: rows.every(({ room }) => room > 0)
      ? rows.reduce((sum, { weighted, room }) => sum + (weighted / room) ** 2, 0)
      : null,
    studentizedInternal: internal,
    studentizedExternal: internal.map((value) => {
      if (value === null) return null;
      const left = df - value * value;
      return df > 1 && left > 1e-9 * df ? value * Math.sqrt((df - 1) / left) : null;
    }),
    cooks: rows.map(({ leverage, room }, row) => {
      const value = internal[row] ?? null;
      return value === null ? null : (value * value * leverage) / (room * model.parameters);
    }),
  };
}
