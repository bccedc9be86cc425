import { AnalysisError, type AnalysisInput, type AnalysisRun } from './analysis.ts';
import { type Layout, layoutOf } from './layout.ts';
import { theoreticalVariance, toScale } from './scales.ts';

/** A run that has a reading, ready for analysis. */
export interface MeasuredRun {
  /** Place among the input's runs. */
  index: number;
  x: number[];
  center: boolean;
  block?: number;
  wholePlot?: number;
  /** On the scale of the analysis. */
  y: number;
  weight: number;
}

export interface MeasuredRuns {
  runs: MeasuredRun[];
  /** Where they are, and their weights. */
  layout: Layout;
  /** Variance of a run of weight one by theory, null for measured results. */
  theory: number | null;
}

/** Less than this off plan, in half ranges, a setting counts as reached. */
const REACHED_TOLERANCE = 0.05;

/**
 * The runs with readings, transformed to the scale of the analysis.
 *
 * @throws AnalysisError when no run has a reading or a reading lies outside the scale
 * @throws RangeError when a run has not one finite setting for each factor
 */
export function selectMeasuredRuns(input: AnalysisInput): MeasuredRuns {
  const scale = input.scale ?? 'raw';
  const numbers = input.factors.flatMap((factor, index) => (factor.kind === 'number' ? [index] : []));
  const outside: number[] = [];
  const runs = input.runs.flatMap((run, index): MeasuredRun[] => {
    if (run.x.length !== input.factors.length || !run.x.every(Number.isFinite))
      throw new RangeError(`analyze: runs[${index}].x must have one finite setting for each factor`);
    if (run.y === null || (run.end ?? 'measured') !== 'measured') return [];
    if (!Number.isFinite(run.y)) throw new AnalysisError('not-a-number', [index]);
    const reading = toScale(scale, run, run.y);
    if (reading === null) {
      outside.push(index);
      return [];
    }
    const x = settingsAsAnalyzed(run);
    return [
      {
        index,
        x,
        center: run.center ?? (numbers.length > 0 && numbers.every((factor) => x[factor] === 0)),
        y: reading.value,
        weight: reading.weight,
        ...(run.block !== undefined && { block: run.block }),
        ...(run.wholePlot !== undefined && { wholePlot: run.wholePlot }),
      },
    ];
  });
  if (outside.length > 0) throw new AnalysisError('reading-outside-scale', outside);
  if (runs.length === 0) throw new AnalysisError('no-readings');

  const meanWeight = runs.reduce((sum, run) => sum + run.weight, 0) / runs.length;
  const theory = theoreticalVariance(scale);
  const unequal = runs.some((run) => run.weight !== runs[0]?.weight);
  const points = runs.map(({ x, center, block, wholePlot }) => ({
    x,
    center,
    ...(block !== undefined && { block }),
    ...(wholePlot !== undefined && { wholePlot }),
  }));
  return {
    runs,
    layout: layoutOf(
      input.factors.map((factor) => factor.letter),
      points,
      unequal ? runs.map((run) => run.weight / meanWeight) : undefined,
    ),
    theory: input.knownVariance ?? (theory === null ? null : theory / meanWeight),
  };
}

function settingsAsAnalyzed(run: AnalysisRun): number[] {
  if (run.group === undefined) return [...run.x];
  return run.x.map((reached) => {
    const planned = Math.max(-1, Math.min(1, Math.round(reached)));
    return Math.abs(reached - planned) < REACHED_TOLERANCE - 1e-12 ? planned : reached;
  });
}
