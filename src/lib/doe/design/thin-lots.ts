import type { ResponseSpec } from '../brief.ts';
import type { Fact } from '../facts.ts';

const enough = 5;

/** A counted result of which a usual run would show fewer than five: counts so small can hardly fall, and their scale no longer steadies them. */
export function warnOfThinLot(
  { kind, lotSize = 1, usualRate }: Pick<ResponseSpec, 'kind' | 'lotSize' | 'usualRate'>,
  result: number,
): Fact[] {
  if (kind === 'measured' || usualRate === undefined || !(usualRate >= 0)) return [];
  const expected = kind === 'rejects' ? lotSize * usualRate : usualRate;
  if (expected >= enough) return [];
  const lotNeeded = expected > 0 ? Math.ceil((enough * lotSize) / expected) : null;
  return [{ kind: 'few-rejects', values: { expected, lotSize, lotNeeded }, refs: { results: [result] } }];
}
