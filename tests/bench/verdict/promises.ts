import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { termValue } from '../../../src/lib/doe/analysis/terms.ts';
import type { Detectable, Proposal } from '../../../src/lib/doe/design/proposal.ts';
import { proposePlans } from '../../../src/lib/doe/design/propose-plans.ts';
import { buildBrief, numberFactor } from '../../builders/simulated-trial.ts';
import { type RandomSource, shuffle } from './simulation.ts';

/** What setting a hard dial afresh is said to add, in standard deviations of a run. */
const PLOT_SD = 0.5;

/** Every plan that is proposed for one to seven number settings and some limit of runs, each once: shuffled freely, in two batches, with a hard setting. */
export function listProposals(): Proposal[] {
  const found = new Map<string, Proposal>();
  for (let factors = 1; factors <= 7; factors++) {
    for (const maxRuns of [8, 10, 11, 12, 15, 16, 19, 20, 35, 36]) {
      const plain = buildBrief(factors, {
        budget: { maxRuns },
        noise: { sd: 1, of: 'runMean', setup: PLOT_SD },
      });
      const split = { ...plain, blocks: { name: 'batch', kind: 'batch' as const, count: 2 } };
      const [, ...easy] = plain.factors;
      const hard = { ...plain, factors: [numberFactor(0, { hardToChange: true }), ...easy] };
      for (const proposal of [plain, split, hard].flatMap(proposals)) found.set(proposal.id, proposal);
    }
  }
  return [...found.values()];
}

function proposals(brief: ReturnType<typeof buildBrief>): Proposal[] {
  try {
    return proposePlans(brief);
  } catch {
    // Too few runs for so many settings: nothing to be measured.
    return [];
  }
}

export interface KeptPromise {
  promise: Detectable;
  /** Rung of the error that the promise is judged by. */
  rung: string;
  power: number;
}

/** For each promise of a plan the share of trials in which *likely* is said of one main effect of its size, under exactly its assumptions. */
export function simulatePromises(proposal: Proposal, trials: number, random: RandomSource): KeptPromise[] {
  return proposal.detectable.map((promise) => {
    const hasHard = proposal.wholePlots !== undefined;
    const letter = promise.effect === 'hardToChange' || !hasHard ? 'A' : 'B';
    const stratum = promise.effect === 'hardToChange' ? 'whole' : 'sub';
    const judgedBy = proposal.errorPlan.strata?.find(({ name }) => name === stratum) ?? proposal.errorPlan;
    const power = simulate({ proposal, promise, letter, rung: judgedBy.rung, trials, random });
    return { promise, rung: judgedBy.rung, power };
  });
}

function simulate(question: {
  proposal: Proposal;
  promise: Detectable;
  letter: string;
  rung: string;
  trials: number;
  random: RandomSource;
}): number {
  const { proposal, promise, letter, rung, trials, random } = question;
  const letters = [...'ABCDEFG'].slice(0, proposal.k);
  const factors = letters.map((name) => ({ letter: name, kind: 'number' as const }));
  const runs = proposal.layout;
  const blank = analyze({ factors, runs: runs.map((run, index) => ({ ...run, y: (index * 7) % 5 })) });
  const others = blank.terms.map(({ term }) => term).filter((term) => term !== letter);
  let seen = 0;
  for (let trial = 0; trial < trials; trial++) {
    const active = rung.startsWith('pseudo')
      ? shuffle(others, random).slice(0, promise.assumedActive - 1)
      : [];
    const plots = new Map<number | undefined, number>();
    const y = runs.map((run) => {
      if (!plots.has(run.wholePlot))
        plots.set(run.wholePlot, run.wholePlot === undefined ? 0 : PLOT_SD * random.normal());
      return [letter, ...active].reduce(
        (sum, term) => sum + (promise.size / 2) * termValue(term, letters, run.x),
        random.normal() + (plots.get(run.wholePlot) ?? 0),
      );
    });
    const analysis = analyze({ factors, runs: runs.map((run, row) => ({ ...run, y: y[row] ?? 0 })) });
    if ((analysis.terms.find(({ term }) => term === letter)?.p ?? 1) < 0.05) seen++;
  }
  return seen / trials;
}
