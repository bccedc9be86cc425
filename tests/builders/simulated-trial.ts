import type { ResultInput } from '../../src/lib/doe/advice/result-model.ts';
import type { AnalysisInput, AnalysisRun } from '../../src/lib/doe/analysis/analysis.ts';
import { analyze } from '../../src/lib/doe/analysis/analyze.ts';
import type { Brief, FactorSpec, ResponseSpec } from '../../src/lib/doe/brief.ts';
import type { PlannedRun } from '../../src/lib/doe/design/proposal.ts';

/** A brief of number settings from -1 to 1 with usual in the middle, more is better, W = 1; any part can be replaced. */
export function buildBrief(factors: number | FactorSpec[], more: Partial<Brief> = {}): Brief {
  return {
    response: { name: 'seal strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 1 },
    watch: [],
    factors:
      typeof factors === 'number'
        ? Array.from({ length: factors }, (_, place) => numberFactor(place))
        : factors,
    forbidden: [],
    budget: { maxRuns: 40 },
    noise: null,
    ...more,
  };
}

export function numberFactor(
  place: number,
  more: Partial<Extract<FactorSpec, { kind: 'number' }>> = {},
): FactorSpec {
  return { name: `setting ${place + 1}`, kind: 'number', unit: '', low: -1, high: 1, usual: 0, ...more };
}

/** Analysis input of a brief's factors at given points. */
export function buildInput(
  brief: Brief,
  runs: readonly (Pick<AnalysisRun, 'x' | 'y'> & Partial<AnalysisRun>)[],
  more: Partial<AnalysisInput> = {},
): AnalysisInput {
  return {
    factors: brief.factors.map(({ kind }, place) => ({ letter: String.fromCharCode(65 + place), kind })),
    runs,
    ...more,
  };
}

export function buildResult(spec: ResponseSpec, input: AnalysisInput): ResultInput {
  return { spec, input, analysis: analyze(input) };
}

/** The plan that the runs of an input were, in their order. */
export function planOf(input: AnalysisInput): PlannedRun[] {
  return input.runs.map((run, index) => ({
    order: run.order ?? index + 1,
    standard: index + 1,
    block: run.block ?? 1,
    group: run.group ?? run.x.join(' '),
    center: run.center ?? run.x.every((value) => value === 0),
    coded: [...run.x],
    actual: [...run.x],
  }));
}
