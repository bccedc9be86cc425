import type { AnalysisRun } from '../analysis/analysis.ts';

/** Settings at levels, by place of the setting: all of them together. */
export interface SharedCause {
  settings: { place: number; level: -1 | 1 }[];
}

export interface Failures {
  /** Places of the runs whose parts could not be made or measured. */
  runs: number[];
  /** For each result with failures that have one: the fewest settings at levels that all its failed runs share and no good run has. */
  causes: SharedCause[];
  /** Whether a combination is one of the failures or is likely to share their cause. */
  excludes(x: readonly number[]): boolean;
}

/**
 * What failed runs say about where not to go. If one cause explains them all, everything that has it is left out; else the failed combinations
 * themselves and those one setting away from them that were not made well.
 */
export function findFailures(runs: readonly AnalysisRun[]): Failures {
  const failed = runs.flatMap((run, index) =>
    run.end === 'failed' || run.end === 'beyondGauge' ? [index] : [],
  );
  const bad = failed.map((index) => runs[index]?.x ?? []);
  if (bad.length === 0) return { runs: [], causes: [], excludes: () => false };
  const good = runs
    .filter((run) => (run.end ?? 'measured') === 'measured' && run.y !== null)
    .map((run) => run.x);
  const cause = findCause(bad, good);
  if (cause !== null) return { runs: failed, causes: [cause], excludes: (x) => has(x, cause.settings) };
  return {
    runs: failed,
    causes: [],
    excludes: (x) =>
      bad.some((point) => differences(point, x) === 0) ||
      (bad.some((point) => differences(point, x) <= 1) && !good.some((point) => differences(point, x) === 0)),
  };
}

/** Failures of several results of the same runs: settings must keep away from all of them. */
export function joinFailures(found: readonly Failures[]): Failures {
  const causes = new Map(
    found.flatMap(({ causes: some }) => some).map((cause) => [JSON.stringify(cause), cause]),
  );
  return {
    runs: [...new Set(found.flatMap(({ runs }) => runs))].sort((first, second) => first - second),
    causes: [...causes.values()],
    excludes: (x) => found.some(({ excludes }) => excludes(x)),
  };
}

function findCause(
  bad: readonly (readonly number[])[],
  good: readonly (readonly number[])[],
): SharedCause | null {
  const factors = bad[0]?.length ?? 0;
  const shared = Array.from({ length: factors }, (_, place) => {
    const levels = new Set(bad.map((x) => Math.sign(x[place] ?? 0)));
    const [level] = levels;
    return levels.size === 1 && (level === 1 || level === -1) ? [{ place, level } as const] : [];
  }).flat();
  for (let size = 1; size <= Math.min(3, shared.length); size++) {
    const found = subsets(shared, size).find((settings) => !good.some((x) => has(x, settings)));
    if (found !== undefined) return { settings: found };
  }
  return null;
}

function has(x: readonly number[], settings: SharedCause['settings']): boolean {
  return settings.every(({ place, level }) => (x[place] ?? 0) * level > 0);
}

function differences(first: readonly number[], second: readonly number[]): number {
  return first.filter((value, index) => Math.abs(value - (second[index] ?? 0)) > 0.1).length;
}

function subsets<Item>(items: readonly Item[], size: number): Item[][] {
  if (size === 0) return [[]];
  return items.flatMap((item, index) =>
    subsets(items.slice(index + 1), size - 1).map((rest) => [item, ...rest]),
  );
}
