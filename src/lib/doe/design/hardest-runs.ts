import type { Brief } from '../brief.ts';
import { groupBy } from './group-by.ts';
import type { PlannedRun } from './proposal.ts';

/** A run to look at before the start. */
export interface HardRun {
  /** Place in the run order of the first run of its combination. */
  order: number;
  /** Settings at the end that is harder on people or machine. */
  hardness: number;
}

const fewest = 2;

/**
 * The corner combinations of a plan with most settings at their harder end, hardest first, each by its first run: all of the hardest, then, while
 * there are fewer than two, all of the next hardest; `most` at most, the earlier ones.
 *
 * Where no setting has a harder end all are alike, with a hardness of 0.
 */
export function hardestRuns(
  brief: Pick<Brief, 'factors'>,
  plannedRuns: readonly PlannedRun[],
  most = 6,
): HardRun[] {
  const corners = plannedRuns
    .filter((run) => !run.center)
    .toSorted((first, second) => first.order - second.order);
  const combinations = groupBy(corners, (run) => run.group).flatMap(([first]) =>
    first === undefined ? [] : { order: first.order, hardness: countHard(brief, first.coded) },
  );
  const byHardness = groupBy(combinations, (run) => run.hardness).sort(
    ([first], [second]) => (second?.hardness ?? 0) - (first?.hardness ?? 0),
  );
  const taken: HardRun[] = [];
  for (const alike of byHardness) {
    if (taken.length >= fewest) break;
    taken.push(...alike);
  }
  return taken.slice(0, most);
}

function countHard({ factors }: Pick<Brief, 'factors'>, coded: readonly number[]): number {
  return factors.filter(({ harderEnd }, index) => {
    const value = coded[index] ?? 0;
    return harderEnd === 'high' ? value > 0 : harderEnd === 'low' && value < 0;
  }).length;
}
