import { expandPoint, invertInformation } from './information.ts';
import type { LayoutRow } from './proposal.ts';
import type { Structure } from './structure.ts';
import { letterAt } from './words.ts';

/**
 * Variance of the least well known main effect among some settings, for a run variance of 1; null when there are none. An effect is twice its
 * coefficient: four over the number of corners where the plan is balanced.
 */
export function worstEffectVariance(
  structure: Structure,
  rows: readonly LayoutRow[],
  settings: readonly number[],
): number | null {
  if (settings.length === 0) return null;
  if (structure.irregular === undefined) return 4 / structure.corners.length;
  const hasMiddles = rows.some((row) => row.center);
  const inverse = invertInformation(rows.map((row) => modelRow(structure, row, hasMiddles)));
  if (inverse === null) return Number.MAX_VALUE;
  const before = (hasMiddles ? 1 : 0) + structure.blocks;
  const places = settings.map((setting) => before + structure.terms.indexOf(letterAt(setting)));
  return Math.max(...places.map((place) => 4 * (inverse[place]?.[place] ?? Number.MAX_VALUE)));
}

/** Its block, its terms, and whether it is a middle run; the mean is in the blocks. */
function modelRow(structure: Structure, row: LayoutRow, hasMiddles: boolean): number[] {
  const blocks = Array.from({ length: structure.blocks }, (_, block) => (row.block === block + 1 ? 1 : 0));
  const bend = hasMiddles ? [row.center ? 1 : 0] : [];
  return [...bend, ...blocks, ...expandPoint(row.x, structure.terms).slice(1)];
}
