import { responseScale } from '../advice/response-scale.ts';
import type { Analysis } from './analysis.ts';
import { predict } from './predict.ts';
import { figureBehind, type Transform } from './transforms.ts';

/** A prediction in the result's own unit (rejects: share of the lot; flaws: per lot). Means on another scale come back as medians. */
export interface UnitPrediction {
  fit: number;
  ci: [number, number] | null;
  pi: [number, number] | null;
  piPart: [number, number] | null;
  bendRange: [number, number] | null;
}

/**
 * What a model says of a point in coded units, turned back from the scale of the analysis.
 *
 * @throws RangeError as `predict`
 */
export function predictInUnit(
  analysis: Analysis,
  x: readonly number[],
  transform: Transform = { kind: 'none' },
): UnitPrediction {
  const { toUnit } = responseScale(analysis.scale);
  const back = (value: number) => figureBehind(transform, toUnit(value));
  const both = (ends: [number, number] | null | undefined): [number, number] | null =>
    ends ? [back(ends[0]), back(ends[1])] : null;
  const { fit, ci, pi, piPart, bendRange } = predict(analysis, x);
  return { fit: back(fit), ci: both(ci), pi: both(pi), piPart: both(piPart), bendRange: both(bendRange) };
}
