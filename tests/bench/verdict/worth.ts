import { bestBet } from '../../../src/lib/doe/advice/best-bet.ts';
import { priorTerms } from '../../../src/lib/doe/advice/effect-regularities.ts';
import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { termValue } from '../../../src/lib/doe/analysis/terms.ts';
import {
  allCorners,
  drawProcess,
  type ProcessRules,
  type RandomProcess,
  regularPlan,
} from '../../builders/random-process.ts';
import { buildBrief, buildInput } from '../../builders/simulated-trial.ts';
import type { RandomSource } from './simulation.ts';

/** One cell of the table: settings, runs, and noise against the size of an active main effect. */
export interface WorthCell {
  factors: number;
  runs: number;
  noise: number;
}

export const CELLS: WorthCell[] = [
  { factors: 3, runs: 8, noise: 0.25 },
  { factors: 3, runs: 8, noise: 1 },
  { factors: 4, runs: 8, noise: 0.5 },
  { factors: 4, runs: 16, noise: 1 },
  { factors: 5, runs: 8, noise: 1 },
  { factors: 5, runs: 16, noise: 0.25 },
  { factors: 7, runs: 8, noise: 1 },
  { factors: 7, runs: 16, noise: 0.5 },
];

const PRODUCTS: Record<string, number[][]> = {
  '3 in 8': [],
  '4 in 8': [[0, 1, 2]],
  '4 in 16': [],
  '5 in 8': [
    [0, 1],
    [0, 2],
  ],
  '5 in 16': [[0, 1, 2, 3]],
  '7 in 8': [
    [0, 1],
    [0, 2],
    [1, 2],
    [0, 1, 2],
  ],
  '7 in 16': [
    [0, 1, 2],
    [1, 2, 3],
    [0, 2, 3],
  ],
};

export const STRATEGIES = [
  'oneAtATime',
  'bestRun',
  'significantOnly',
  'allEstimates',
  'shrunken',
  'bestBet',
] as const;
export type Strategy = (typeof STRATEGIES)[number];

/** Mean share of the possible improvement, and the paired standard error of best bet minus shrunken. */
export interface Worth {
  shares: Record<Strategy, number>;
  pairedError: number;
}

/** Share of the possible improvement that each way of choosing settings reaches: the center is 0, the best corner of the true process 1. */
export function measureWorth(question: {
  cell: WorthCell;
  processes: number;
  random: RandomSource;
  rules?: ProcessRules;
}): Worth {
  const { cell, processes, random, rules } = question;
  const letters = [...'ABCDEFG'].slice(0, cell.factors);
  const points = regularPlan(Math.log2(cell.runs), PRODUCTS[`${cell.factors} in ${cell.runs}`]);
  const known = prepare(letters, points, cell.noise);
  const sums = Object.fromEntries(STRATEGIES.map((name) => [name, 0])) as Record<Strategy, number>;
  let differences = 0;
  let squares = 0;
  for (let draw = 0; draw < processes; draw++) {
    const process = drawProcess(letters, random, rules);
    const best = Math.max(...known.corners.map((x) => process.valueAt(x)));
    const y = points.map((x) => process.valueAt(x) + cell.noise * random.normal());
    const chosen = chooseAll({ known, process, points, y, noise: cell.noise, random });
    for (const name of STRATEGIES) sums[name] += process.valueAt(chosen[name]) / best;
    const difference = (process.valueAt(chosen.bestBet) - process.valueAt(chosen.shrunken)) / best;
    differences += difference;
    squares += difference * difference;
  }
  const shares = Object.fromEntries(STRATEGIES.map((name) => [name, sums[name] / processes])) as Record<
    Strategy,
    number
  >;
  const mean = differences / processes;
  return { shares, pairedError: Math.sqrt((squares / processes - mean * mean) / processes) };
}

interface Prepared {
  letters: string[];
  corners: number[][];
  /** Values of the terms at the corners. */
  values: number[][];
  /** Weights on readings for the coefficients of all estimable terms up to pairs, and shrunken with noise known. */
  estimates: number[][];
  shrunken: number[][];
}

function prepare(letters: string[], points: number[][], noise: number): Prepared {
  const prior = priorTerms(letters);
  const n = points.length;
  const columns = prior.map(({ term }) => points.map((x) => termValue(term, letters, x)));
  const product = (first: readonly number[], second: readonly number[]) =>
    first.reduce((sum, value, row) => sum + value * (second[row] ?? 0), 0);
  const ones = points.map(() => 1);
  const sharing = (place: number) =>
    prior.flatMap((_, other) =>
      Math.abs(product(columns[place] ?? [], columns[other] ?? [])) === n ? [other] : [],
    );
  const nothing = points.map(() => 0);
  return {
    letters,
    corners: allCorners(letters.length),
    values: allCorners(letters.length).map((x) => prior.map(({ term }) => termValue(term, letters, x))),
    estimates: prior.map(({ term }, place) => {
      const column = columns[place] ?? [];
      const isFirst = sharing(place)[0] === place && Math.abs(product(column, ones)) < n;
      return term.length <= 2 && isFirst ? column.map((value) => value / n) : nothing;
    }),
    shrunken: prior.map(({ variance }, place) => {
      const column = columns[place] ?? [];
      if (Math.abs(product(column, ones)) === n) return nothing;
      const total = sharing(place).reduce((sum, other) => sum + (prior[other]?.variance ?? 0), 0);
      return column.map((value) => (value / n) * (variance / (total + noise ** 2 / n)));
    }),
  };
}

function chooseAll(question: {
  known: Prepared;
  process: RandomProcess;
  points: number[][];
  y: number[];
  noise: number;
  random: RandomSource;
}): Record<Strategy, number[]> {
  const { known, points, y } = question;
  const weigh = (weights: number[][]) =>
    weights.map((row) => row.reduce((sum, weight, index) => sum + weight * (y[index] ?? 0), 0));
  const bestCorner = (coefficients: number[]) => {
    const expected = known.values.map((row) =>
      row.reduce((sum, value, index) => sum + value * (coefficients[index] ?? 0), 0),
    );
    return known.corners[expected.indexOf(Math.max(...expected))] ?? [];
  };
  const brief = buildBrief(known.letters.length, {
    response: { name: 'result', unit: '', kind: 'measured', goal: 'more', worthHaving: 1e-9 },
  });
  const input = buildInput(
    brief,
    points.map((x, index) => ({ x, y: y[index] ?? 0 })),
  );
  const analysis = analyze(input);
  const significant = known.letters.map((letter) => {
    const term = analysis.terms.find((entry) => entry.term === letter);
    return term !== undefined && (term.p ?? 1) < 0.05 ? Math.sign(term.effect) : 0;
  });
  return {
    oneAtATime: changeOneAtATime(question),
    bestRun: points[y.indexOf(Math.max(...y))] ?? [],
    significantOnly: significant,
    allEstimates: bestCorner(weigh(known.estimates)),
    shrunken: bestCorner(weigh(known.shrunken)),
    bestBet: bestBet(brief, [{ spec: brief.response, input, analysis }]).coded,
  };
}

/** From a random corner, flip each setting once and keep what is better; each point repeated as often as the runs allow. */
function changeOneAtATime(question: {
  known: Prepared;
  process: RandomProcess;
  points: number[][];
  noise: number;
  random: RandomSource;
}): number[] {
  const { known, process, points, noise, random } = question;
  const repeats = Math.max(1, Math.floor(points.length / (known.letters.length + 1)));
  const read = (x: number[]) => process.valueAt(x) + (noise / Math.sqrt(repeats)) * random.normal();
  let x: number[] = known.letters.map(() => (random.uniform() < 0.5 ? -1 : 1));
  let reading = read(x);
  for (let place = 0; place < x.length; place++) {
    const flipped = x.with(place, -(x[place] ?? 0));
    const next = read(flipped);
    if (next > reading) [x, reading] = [flipped, next];
  }
  return x;
}
