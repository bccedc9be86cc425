import type { AnalysisRun, Scale } from '../analysis/analysis.ts';
import { toScale } from '../analysis/scales.ts';
import type { Brief } from '../brief.ts';
import type { CheckReadings } from './judge-confirmation.ts';
import { checkGroups } from './lay-out-check-runs.ts';

/** One check run: which of the two settings it was made at, and its readings, main result first; null where one is missing. */
export interface CheckRunReading {
  group: string;
  results: readonly (Pick<AnalysisRun, 'y' | 'n'> | null)[];
}

/**
 * What `judgeConfirmation` asks for: the main result on the scale of the trial's analysis, watched results in their unit (rejects: share of the lot).
 * Runs without a figure of the main result are left out.
 */
export function readCheckRuns(brief: Brief, scale: Scale, runs: readonly CheckRunReading[]): CheckReadings {
  const at = (group: string) => runs.filter((run) => run.group === group);
  const mainAt = (group: string) =>
    at(group).flatMap(({ results: [main] }) => {
      const y = main?.y;
      if (!main || y === null || y === undefined) return [];
      const read = toScale(scale, { x: [], ...main }, y);
      return read === null ? [] : [read.value];
    });
  return {
    atBest: mainAt(checkGroups.best),
    atUsual: mainAt(checkGroups.usual),
    watchedAtBest: brief.watch.map((spec, place) =>
      at(checkGroups.best).flatMap(({ results }) => {
        const reading = results[place + 1];
        if (!reading || reading.y === null) return [];
        return [spec.kind === 'rejects' ? reading.y / (reading.n ?? spec.lotSize ?? 1) : reading.y];
      }),
    ),
  };
}
