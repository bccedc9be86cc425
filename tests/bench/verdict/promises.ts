import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { termValue } from '../../../src/lib/doe/analysis/terms.ts';
import type { Proposal } from '../../../src/lib/doe/design/proposal.ts';
import { proposePlans } from '../../../src/lib/doe/design/propose-plans.ts';
import { buildBrief } from '../../builders/simulated-trial.ts';
import { type RandomSource, shuffle } from './simulation.ts';

/** Every plan of the catalogue that is proposed for one to seven number settings and some limit of runs, each once. */
export function listProposals(): Proposal[] {
  const found = new Map<string, Proposal>();
  for (let factors = 1; factors <= 7; factors++) {
    for (const maxRuns of [8, 10, 11, 12, 15, 16, 19, 20, 35, 36]) {
      const brief = buildBrief(factors, { budget: { maxRuns }, noise: { sd: 1, of: 'runMean' } });
      for (const proposal of proposals(brief)) found.set(proposal.id, proposal);
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

/** Share of trials in which *likely* is said of one main effect of the size promised, under exactly the assumptions of the promise. */
export function simulatePromise(proposal: Proposal, trials: number, random: RandomSource): number | null {
  const promise = proposal.detectable.find(({ effect }) => effect === 'easy');
  if (promise === undefined) return null;
  const letters = [...'ABCDEFG'].slice(0, proposal.k);
  const factors = letters.map((letter) => ({ letter, kind: 'number' as const }));
  const runs = proposal.layout.map(({ x, block, center }) => ({ x, block, center }));
  const blank = analyze({ factors, runs: runs.map((run, index) => ({ ...run, y: (index * 7) % 5 })) });
  const others = blank.terms.map(({ term }) => term).filter((term) => term !== 'A');
  const isPseudo = proposal.errorPlan.rung.startsWith('pseudo');
  let seen = 0;
  for (let trial = 0; trial < trials; trial++) {
    const active = isPseudo ? shuffle(others, random).slice(0, promise.assumedActive - 1) : [];
    const y = runs.map((run) =>
      ['A', ...active].reduce(
        (sum, term) => sum + (promise.size / 2) * termValue(term, letters, run.x),
        random.normal(),
      ),
    );
    const analysis = analyze({ factors, runs: runs.map((run, row) => ({ ...run, y: y[row] ?? 0 })) });
    if ((analysis.terms.find(({ term }) => term === 'A')?.p ?? 1) < 0.05) seen++;
  }
  return seen / trials;
}
