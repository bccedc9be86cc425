import type { Scale } from '../analysis/analysis.ts';
import type { ResponseSpec } from '../brief.ts';

/** The way from the scale of the analysis to the result's unit and back. Rejects are shares of the lot, flaws counts per lot. */
export interface ResponseScale {
  toUnit(value: number): number;
  fromUnit(figure: number): number;
  /** A change on the scale of the analysis, around `center`, as a change in the unit. */
  changeInUnit(change: number, center: number): number;
  /** W on the scale of the analysis, around `center`; null: not given. */
  worthHaving(spec: ResponseSpec, center: number): number | null;
}

const CURVES: Record<Scale, { toUnit: (value: number) => number; fromUnit: (figure: number) => number }> = {
  raw: { toUnit: (value) => value, fromUnit: (figure) => figure },
  log: { toUnit: Math.exp, fromUnit: (figure) => Math.log(Math.max(figure, Number.MIN_VALUE)) },
  sqrt: { toUnit: (value) => Math.max(0, value) ** 2, fromUnit: (figure) => Math.sqrt(Math.max(0, figure)) },
  'freeman-tukey': {
    toUnit: (value) => Math.sin(Math.min(Math.PI / 2, Math.max(0, value))) ** 2,
    fromUnit: (figure) => Math.asin(Math.sqrt(Math.min(1, Math.max(0, figure)))),
  },
};

export function responseScale(scale: Scale): ResponseScale {
  const { toUnit, fromUnit } = CURVES[scale];
  const changeInUnit = (change: number, center: number) =>
    scale === 'raw' ? change : toUnit(center + change / 2) - toUnit(center - change / 2);
  return {
    toUnit,
    fromUnit,
    changeInUnit,
    worthHaving(spec, center) {
      const size = spec.worthHaving;
      if (size === undefined || !(size > 0)) return null;
      if (scale === 'raw') return size;
      // Counts: from the usual rate to the rate that would be worth having, the good way.
      const usual = spec.usualRate ?? toUnit(center);
      if (scale !== 'log') {
        const better = spec.goal === 'less' ? usual - size : usual + size;
        const reachable = toUnit(fromUnit(better));
        const other = spec.goal === 'less' ? usual + size : usual - size;
        const end = Math.abs(reachable - better) < 1e-9 ? better : other;
        return Math.abs(fromUnit(end) - fromUnit(usual));
      }
      return 2 * Math.asinh(size / (2 * toUnit(center)));
    },
  };
}
