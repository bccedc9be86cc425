import {
  type AnalysisInput,
  type AnalysisRun,
  analyze,
  type Brief,
  encode,
  letterAt,
  meanOfParts,
  type PlannedRun,
  type Proposal,
  type ResponseSpec,
  type ResultInput,
  type Scale,
} from '../../lib/doe/index.ts';
import type { CountedReading, VerdictRun } from './verdict-runs.ts';

const scaleOf: Record<ResponseSpec['kind'], Scale> = {
  measured: 'raw',
  rejects: 'freeman-tukey',
  flaws: 'sqrt',
};

/** The figure of one run for one result, as the core takes it. */
export function figureOf(
  spec: ResponseSpec,
  readings: readonly CountedReading[],
): Pick<AnalysisRun, 'y' | 'parts' | 'n'> {
  if (spec.kind === 'measured') {
    const parts = [...readings].sort((a, b) => a.part - b.part).flatMap(({ value }) => value ?? []);
    if (parts.length === 0) return { y: null };
    const y = meanOfParts(parts);
    return parts.length > 1 ? { y, parts } : { y };
  }
  const [reading] = readings;
  const count = reading?.rejects ?? reading?.value ?? null;
  if (count === null) return { y: null };
  const lot = reading?.lot ?? spec.lotSize ?? 1;
  // Rejects: parts inspected. Flaws: lots of the usual size.
  return { y: count, n: spec.kind === 'rejects' ? lot : lot / (spec.lotSize ?? lot) };
}

function toAnalysisRun(
  brief: Brief,
  run: VerdictRun,
  result: number,
  spec: ResponseSpec,
  has: Layout,
): AnalysisRun {
  const x = run.actual
    ? brief.factors.map((factor, place) => encode(factor, run.actual?.[place] ?? run.planned[place] ?? 0))
    : run.coded;
  const figure = figureOf(
    spec,
    run.readings.filter((reading) => reading.result === result),
  );
  const end = figure.y === null && (run.end === null || run.end === 'measured') ? 'notRun' : run.end;
  return {
    ...figure,
    x,
    group: run.group,
    center: run.center,
    order: run.place,
    ...(has.blocks ? { block: run.block } : {}),
    ...(run.wholePlot === null ? {} : { wholePlot: run.wholePlot }),
    ...(end === null ? {} : { end }),
  };
}

interface Layout {
  blocks: boolean;
}

/**
 * What the core judges: one input for each result with its analysis, main result first. The error plan that was fixed
 * before the start holds while every planned run has its reading; otherwise the core decides anew from what is left.
 */
export function toResultInputs(
  brief: Brief,
  proposal: Pick<Proposal, 'errorPlan' | 'terms' | 'runs'>,
  runs: readonly VerdictRun[],
): ResultInput[] {
  const has = { blocks: new Set(runs.map(({ block }) => block)).size > 1 };
  return [brief.response, ...brief.watch].map((spec, result) => {
    const analysisRuns = runs.map((run) => toAnalysisRun(brief, run, result, spec, has));
    const asPlanned = analysisRuns.length === proposal.runs && analysisRuns.every(({ y }) => y !== null);
    const input: AnalysisInput = {
      factors: brief.factors.map(({ kind }, place) => ({ letter: letterAt(place), kind })),
      runs: analysisRuns,
      scale: scaleOf[spec.kind],
      terms: proposal.terms,
      ...(asPlanned ? { errorPlan: proposal.errorPlan } : {}),
    };
    return { spec, input, analysis: analyze(input) };
  });
}

/** The plan as the core asks for it, from the stored runs. */
export function toPlannedRuns(runs: readonly VerdictRun[]): PlannedRun[] {
  return runs.map((run) => ({
    order: run.place,
    standard: run.number,
    block: run.block,
    ...(run.wholePlot === null ? {} : { wholePlot: run.wholePlot }),
    group: run.group,
    center: run.center,
    coded: run.coded,
    actual: run.planned,
  }));
}
