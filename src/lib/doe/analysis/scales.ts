import type { AnalysisRun, Scale } from './analysis.ts';

/** A reading on the scale of the analysis. */
export interface ScaledReading {
  value: number;
  /** How many readings of variance one it is worth. */
  weight: number;
}

interface ScaleRules {
  /** null: the reading lies outside the scale. */
  toScale: (run: AnalysisRun, y: number) => ScaledReading | null;
  /** Variance of a reading of weight one when nothing but chance decides which parts fail; null: not known. */
  theoreticalVariance: number | null;
}

const RULES: Record<Scale, ScaleRules> = {
  raw: { toScale: (_, y) => ({ value: y, weight: 1 }), theoreticalVariance: null },
  log: {
    toScale: (_, y) => (y > 0 ? { value: Math.log(y), weight: 1 } : null),
    theoreticalVariance: null,
  },
  // Flaws over n units: the root of the rate has variance 1 / (4 n) (Bartlett 1936).
  sqrt: {
    toScale: (run, y) => {
      const units = run.n ?? 1;
      return y >= 0 && units > 0 ? { value: Math.sqrt(y / units), weight: 4 * units } : null;
    },
    theoreticalVariance: 1,
  },
  // Rejects out of n (Freeman & Tukey 1950, Annals of Mathematical Statistics 21; for fractions of factorials Bisgaard & Fuller 1994,
  // Quality Engineering 7): variance 1 / (4 n + 2).
  'freeman-tukey': {
    toScale: (run, y) => {
      const n = run.n;
      if (n === undefined || !(n > 0) || y < 0 || y > n) return null;
      return {
        value: (Math.asin(Math.sqrt(y / (n + 1))) + Math.asin(Math.sqrt((y + 1) / (n + 1)))) / 2,
        weight: 4 * n + 2,
      };
    },
    theoreticalVariance: 1,
  },
};

/** A run's figure on the scale of the analysis; null when it lies outside, as zero does for logarithms. */
export function toScale(scale: Scale, run: AnalysisRun, y: number): ScaledReading | null {
  return RULES[scale].toScale(run, y);
}

/** Variance, by theory, of a reading of weight one; null for measured results. */
export function theoreticalVariance(scale: Scale): number | null {
  return RULES[scale].theoreticalVariance;
}
