import type { AuditFactor } from '../audit-view.ts';

/** A term by its factors' names: `AB` as `JAW TEMP × DWELL`. */
export function nameTerm(term: string, factors: readonly AuditFactor[]): string {
  return [...term]
    .map((letter) => factors.find((each) => each.letter === letter)?.name ?? letter)
    .join(' \u00d7 ');
}
