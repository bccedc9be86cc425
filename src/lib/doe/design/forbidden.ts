import type { Brief, ForbiddenRule } from '../brief.ts';
import { listCorners } from './list-corners.ts';
import { readWord } from './words.ts';

/**
 * Whether a point, in coded settings, must never be run: some rule has every setting that it names beyond its middle towards the forbidden level (a
 * choice: at it). The middle itself is not beyond the middle; whether it may be run is asked of a person, as for every hard run.
 *
 * Layouts, best bet, predictions and next trials all ask here.
 */
export function isForbidden(brief: Pick<Brief, 'forbidden'>, x: readonly number[]): boolean {
  return brief.forbidden.some((rule) => appliesTo(rule, x));
}

/** Indices of the settings that a rule names. */
export function settingsOfRule(rule: ForbiddenRule): number[] {
  return Object.keys(rule).map((letter) => Math.log2(readWord(letter)));
}

/** How many of all combinations of low and high a rule takes away. */
export function countForbidden(
  factors: readonly unknown[],
  rule: ForbiddenRule,
): { ruledOut: number; corners: number } {
  const corners = listCorners(factors.length);
  return { ruledOut: corners.filter((x) => appliesTo(rule, x)).length, corners: corners.length };
}

function appliesTo(rule: ForbiddenRule, x: readonly number[]): boolean {
  const named = Object.entries(rule);
  return (
    named.length > 0 && named.every(([letter, level]) => (x[letter.charCodeAt(0) - 65] ?? 0) * level > 0)
  );
}
