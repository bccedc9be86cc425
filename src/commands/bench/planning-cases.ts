import { type Brief, type ForbiddenRule, layOutRuns, proposePlans } from '../../lib/doe/index.ts';

/** Something to time: a call, how often, and the most milliseconds it may take. */
export interface Benchmark {
  name: string;
  limit: number;
  rounds: number;
  run: (round: number) => void;
}

const rules: ForbiddenRule[] = [
  { A: 1, B: 1, C: 1 },
  { C: 1, D: -1 },
  { E: 1, F: 1, G: 1 },
  { A: -1, C: -1, G: -1 },
  { B: -1, D: 1, F: -1, G: 1 },
];

function sevenSettings(forbidden: ForbiddenRule[]): Brief {
  return {
    response: { name: 'seal strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3 },
    watch: [],
    factors: Array.from({ length: 7 }, (_, index) => ({
      kind: 'number' as const,
      name: `setting ${index + 1}`,
      unit: 'C',
      low: 140,
      high: 160,
      usual: 150,
      settleMinutes: index,
    })),
    forbidden,
    budget: { maxRuns: 40, minutesPerRun: 10, costPerRun: 5 },
    noise: { sd: 1.5, of: 'part' },
  };
}

const free = sevenSettings([]);

/** The letters of a rule in another order. */
function turn(rule: ForbiddenRule, by: number): ForbiddenRule {
  const levels = Object.entries(rule);
  return Object.fromEntries(levels.map((_, place) => levels[(place + by) % levels.length] ?? ['A', 1]));
}

/** The same rules written in another order: nothing found for one is of use to the next. */
const ruled = Array.from({ length: 60 }, (_, round) =>
  sevenSettings(
    rules.map((_, place) =>
      turn(rules[(place + round) % rules.length] ?? {}, Math.floor(round / rules.length)),
    ),
  ),
);
const grouped: Brief = {
  ...free,
  factors: free.factors.map((factor, index) => ({ ...factor, hardToChange: index < 2 })),
};
const largest = proposePlans(free).reduce((most, proposal) => (proposal.runs > most.runs ? proposal : most));

/** The figures that the product promises of planning: proposals that re-deal while a slider moves. */
export const planningCases: Benchmark[] = [
  {
    name: 'all proposals, seven settings, five rules',
    limit: 50,
    rounds: 40,
    run: (round) => void proposePlans(ruled[round % ruled.length] ?? free),
  },
  {
    name: 'all proposals, seven settings, no rules',
    limit: 50,
    rounds: 40,
    run: () => void proposePlans(free),
  },
  {
    name: 'all proposals, seven settings, two hard to change',
    limit: 50,
    rounds: 40,
    run: () => void proposePlans(grouped),
  },
  {
    name: `one plan laid out, ${largest.runs} runs`,
    limit: 1,
    rounds: 500,
    run: (seed) => void layOutRuns(free, largest, seed),
  },
];
