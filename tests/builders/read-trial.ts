import { bestBet } from '../../src/lib/doe/advice/best-bet.ts';
import { judge } from '../../src/lib/doe/advice/judge.ts';
import type { AnalysisRun } from '../../src/lib/doe/analysis/analysis.ts';
import { createNormalSource } from '../../src/lib/doe/random/normal-numbers.ts';
import { createUniformSource } from '../../src/lib/doe/random/random-numbers.ts';
import { regularPlan } from './random-process.ts';
import { buildBrief, buildInput, buildResult, planOf } from './simulated-trial.ts';

export type Reading = (x: readonly number[], index: number) => number | null;

export const middles = (factors: number, count: number) =>
  Array.from({ length: count }, () => new Array<number>(factors).fill(0));

/** A half fraction in four settings with four middles, D = ABC, read by a function of the settings. */
export function readTrial(reading: Reading, brief = buildBrief(4), more: Partial<AnalysisRun>[] = []) {
  const points = [...regularPlan(3, [[0, 1, 2]]), ...middles(4, 4)];
  const runs = points.map((x, index) => ({ x, order: index + 1, y: reading(x, index), ...more[index] }));
  const input = buildInput(brief, runs);
  const results = [buildResult(brief.response, input)];
  return {
    brief,
    input,
    results,
    verdict: judge(brief, planOf(input), results),
    bet: bestBet(brief, results),
  };
}

/** Normal noise from a seed. */
export function wobble(seed: number, sd: number): () => number {
  const normal = createNormalSource(createUniformSource(seed));
  return () => sd * normal();
}

export const kindsOf = (facts: readonly { kind: string }[]) => facts.map(({ kind }) => kind);
