import { mean, sampleStandardDeviation } from 'simple-statistics';

/** What past numbers say of today: their mean, and their standard deviation with its degrees of freedom. */
export interface PastNumbers {
  mean: number;
  sd: number;
  df: number;
}

/** @returns null when there are fewer than two, or when they are all the same and so say nothing of the ups and downs */
export function describePast(figures: readonly number[]): PastNumbers | null {
  if (figures.length < 2) return null;
  const sd = sampleStandardDeviation([...figures]);
  return sd > 0 ? { mean: mean([...figures]), sd, df: figures.length - 1 } : null;
}

/** The same from the lowest and the highest figure of a normal day, which span about four standard deviations. */
export function spreadOfExtremes(lowest: number, highest: number): { sd: number; df: number } {
  return { sd: (highest - lowest) / 4, df: 4 };
}
