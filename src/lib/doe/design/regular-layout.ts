import type { LayoutRun } from './error-plan.ts';

/**
 * Whether the corner runs are exactly one regular two-level plan: each of its 2^p corners once, and each block a regular part of it.
 *
 * A set of corners is regular when, seen from any of its members, it is closed under multiplying settings (a subgroup). All single-degree
 * contrasts are then orthogonal, with one and the same variance.
 */
export function isRegularComplete(runs: readonly LayoutRun[]): boolean {
  const corners = runs.filter((run) => !run.center);
  if (corners.some((run) => run.x.some((value) => Math.abs(value) !== 1))) return false;
  const all = subgroupOf(corners);
  if (all === null) return false;
  const blocks = new Set(corners.map((run) => run.block));
  const parts = [...blocks].map((block) => subgroupOf(corners.filter((run) => run.block === block)));
  return parts.every((part) => part !== null && part === parts[0]);
}

/** The corners seen from the first one, as a sorted text of bit patterns; null when one is repeated or they are not closed. */
function subgroupOf(corners: readonly LayoutRun[]): string | null {
  const patterns = corners.map((run) => run.x.reduce((bits, value) => bits * 2 + (value > 0 ? 1 : 0), 0));
  const origin = patterns[0];
  if (origin === undefined) return null;
  const members = new Set(patterns.map((pattern) => pattern ^ origin));
  if (members.size !== corners.length) return null;
  for (const first of members) for (const second of members) if (!members.has(first ^ second)) return null;
  return [...members].sort((first, second) => first - second).join(' ');
}
