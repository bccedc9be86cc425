import { fitsScale, scoreRange } from '../finished/problem.schema.ts';
import type { FinishedOf } from '../finished.schema.ts';

/** A result, the main one or one to keep an eye on, as it was described. */
export interface SpokenResult {
  name: string;
  unit: string;
  wish: FinishedOf<'result'>['wish'];
  target: number | null;
  kind: FinishedOf<'result'>['kind'];
  lotSize: number | null;
}

export interface SpokenLimits {
  atLeast: number | null;
  atMost: number | null;
  limitFor: 'mean' | 'part';
  noLimit: boolean;
}

/** Limits that no figure of the result could ever pass or miss. */
export function limitsOffScale(
  result: SpokenResult,
  limits: Pick<SpokenLimits, 'atLeast' | 'atMost'>,
): ('atLeast' | 'atMost')[] {
  return (['atLeast', 'atMost'] as const).filter((side) => {
    const limit = limits[side];
    return limit !== null && !fitsScale(limit, result);
  });
}

/** The widest change that a result's scale has room for; null: no end. */
export function widestChange(result: Pick<SpokenResult, 'kind' | 'lotSize'>): number | null {
  if (result.kind === 'scored') return scoreRange.most - scoreRange.least;
  return result.kind === 'rejects' ? result.lotSize : null;
}
