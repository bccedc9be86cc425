import type { Brief } from '../brief.ts';
import { encode } from '../design/dial.ts';

/** Usual settings in coded units. */
export function usualSettings(brief: Brief): number[] {
  return brief.factors.map((factor) =>
    factor.kind === 'choice' ? (factor.usual === 'high' ? 1 : -1) : encode(factor, factor.usual),
  );
}

/** The same on the dials: numbers in their unit, choices by name. */
export function usualValues({ factors }: Pick<Brief, 'factors'>): (number | string)[] {
  return factors.map((factor) =>
    factor.kind === 'choice' ? (factor.usual === 'high' ? factor.high : factor.low) : factor.usual,
  );
}
