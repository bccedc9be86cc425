import { mean } from 'simple-statistics';

/**
 * The figure of a run whose parts were measured: their mean. The parts are never repeats of the run.
 * @throws RangeError when there are no parts
 */
export function meanOfParts(parts: readonly number[]): number {
  if (parts.length === 0) throw new RangeError('meanOfParts: parts must not be empty');
  return mean([...parts]);
}
