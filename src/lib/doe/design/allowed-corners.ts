import type { Brief } from '../brief.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { isForbidden } from './forbidden.ts';
import { listCorners } from './list-corners.ts';

/** All corners that no rule forbids, in standard order. */
export function listAllowedCorners(brief: Pick<Brief, 'factors' | 'forbidden'>): number[][] {
  return listCorners(brief.factors.length).filter((x) => !isForbidden(brief, x));
}

/** Whether some corners can still show the main effect of each of k settings. */
export function canShowMainEffects(corners: readonly number[][], k: number): boolean {
  const space = createColumnSpace([corners.map(() => 1)]);
  return Array.from({ length: k }, (_, index) => corners.map((x) => x[index] ?? 0)).every((column) =>
    space.add(column),
  );
}
