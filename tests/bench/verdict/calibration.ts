import { decideCall } from '../../../src/lib/doe/advice/calls.ts';
import type { Analysis } from '../../../src/lib/doe/analysis/analysis.ts';
import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { termValue } from '../../../src/lib/doe/analysis/terms.ts';
import { drawProcess } from '../../builders/random-process.ts';
import type { SimulatedPlan } from './plans.ts';
import { type RandomSource, shuffle } from './simulation.ts';

export interface Calibration {
  plan: string;
  source: string;
  active: number;
  experiments: number;
  /** *likely* or *clear* about one null effect, chosen beforehand. */
  falseLikely: number;
  nulls: number;
  /** Experiments with any *clear* among null effects. */
  anyFalseClear: number;
  /** Intervals that hold the true effect. */
  covered: number;
  intervals: number;
  /** *likely* about a given active effect. */
  seen: number;
}

/** Experiments of one plan with a number of active contrasts, each `size` run-to-run standard deviations from low to high. */
export function calibrate(question: {
  plan: SimulatedPlan;
  active: number;
  size: number;
  experiments: number;
  random: RandomSource;
  /** Standard deviation that whole plots add. */
  plotSd?: number;
}): Calibration {
  const { plan, active, size, experiments, random } = question;
  const letters = [...'ABCDEFG'].slice(0, plan.runs[0]?.x.length ?? 0);
  const factors = letters.map((letter) => ({ letter, kind: 'number' as const }));
  const terms = analyzeAt(
    plan,
    factors,
    plan.runs.map((_, index) => index % 3),
  ).terms.map(({ term }) => term);
  const columns = new Map(
    terms.map((term) => [term, plan.runs.map((run) => termValue(term, letters, run.x))]),
  );
  const found: Calibration = {
    plan: plan.name,
    source: '',
    active,
    experiments,
    falseLikely: 0,
    nulls: 0,
    anyFalseClear: 0,
    covered: 0,
    intervals: 0,
    seen: 0,
  };
  for (let experiment = 0; experiment < experiments; experiment++) {
    const order = shuffle(terms, random);
    const chosen = new Set(order.slice(0, active));
    const plots = new Map<number | undefined, number>();
    const y = plan.runs.map((run, row) => {
      if (!plots.has(run.wholePlot))
        plots.set(run.wholePlot, run.wholePlot === undefined ? 0 : (question.plotSd ?? 0) * random.normal());
      let value = random.normal() + (plots.get(run.wholePlot) ?? 0);
      for (const term of chosen) value += (size / 2) * (columns.get(term)?.[row] ?? 0);
      return value;
    });
    const analysis = analyzeAt(plan, factors, y);
    found.source = analysis.error.strata ? 'strata' : analysis.error.source;
    count(found, analysis, { chosen, size, null: order[active], shown: order[0] });
  }
  return found;
}

function analyzeAt(
  plan: SimulatedPlan,
  factors: { letter: string; kind: 'number' }[],
  y: readonly number[],
): Analysis {
  return analyze({ factors, runs: plan.runs.map((run, row) => ({ ...run, y: y[row] ?? 0 })) });
}

function count(
  found: Calibration,
  analysis: Analysis,
  truth: { chosen: Set<string>; size: number; null: string | undefined; shown: string | undefined },
): void {
  let anyClear = false;
  for (const term of analysis.terms) {
    const isActive = truth.chosen.has(term.term);
    if (term.ci !== null) {
      const value = isActive ? truth.size : 0;
      found.intervals++;
      if (term.ci[0] <= value && value <= term.ci[1]) found.covered++;
    }
    if (!isActive && (term.pFamily ?? 1) < 0.05) anyClear = true;
    if (term.term === truth.null) {
      found.nulls++;
      if ((term.p ?? 1) < 0.05) found.falseLikely++;
    }
    if (isActive && term.term === truth.shown && (term.p ?? 1) < 0.05) found.seen++;
  }
  if (anyClear) found.anyFalseClear++;
}

/** Share of intervals that hold the true effect, its ties included, over processes drawn by the published regularities. */
export function coverProcesses(question: {
  plan: SimulatedPlan;
  /** Standard deviation of noise over that of an active main effect. */
  noise: number;
  experiments: number;
  random: RandomSource;
}): { covered: number; intervals: number } {
  const { plan, noise, experiments, random } = question;
  const letters = [...'ABCDEFG'].slice(0, plan.runs[0]?.x.length ?? 0);
  const factors = letters.map((letter) => ({ letter, kind: 'number' as const }));
  const found = { covered: 0, intervals: 0 };
  for (let experiment = 0; experiment < experiments; experiment++) {
    const process = drawProcess(letters, random);
    const y = plan.runs.map((run) => process.valueAt(run.x) + noise * random.normal());
    const { terms, aliases } = analyzeAt(plan, factors, y);
    for (const { term, ci } of terms) {
      if (ci === null) continue;
      const tied = aliases.find((alias) => alias.term === term)?.with ?? [];
      const truth = [{ term, coefficient: 1 }, ...tied].reduce(
        (sum, member) =>
          sum + 2 * member.coefficient * (process.coefficients[process.terms.indexOf(member.term)] ?? 0),
        0,
      );
      found.intervals++;
      if (ci[0] <= truth && truth <= ci[1]) found.covered++;
    }
  }
  return found;
}

/** Shares of the four calls about one effect whose true size is known. */
export function shareCalls(question: {
  plan: SimulatedPlan;
  size: number;
  worthHaving: number;
  experiments: number;
  random: RandomSource;
}): Map<string, number> {
  const { plan, size, worthHaving, experiments, random } = question;
  const letters = [...'ABCDEFG'].slice(0, plan.runs[0]?.x.length ?? 0);
  const factors = letters.map((letter) => ({ letter, kind: 'number' as const }));
  const shares = new Map<string, number>();
  for (let experiment = 0; experiment < experiments; experiment++) {
    const y = plan.runs.map(
      (run) => random.normal() + (size / 2) * (run.x[0] ?? 0) + worthHaving * (run.x[1] ?? 0),
    );
    const [term] = analyzeAt(plan, factors, y).terms;
    if (term === undefined) continue;
    const { call } = decideCall({ ci: term.ci, pFamily: term.pFamily, worthHaving, alpha: 0.05 });
    shares.set(call, (shares.get(call) ?? 0) + 1);
  }
  return shares;
}
