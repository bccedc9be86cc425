import { bestBet } from '../../../src/lib/doe/advice/best-bet.ts';
import { judge } from '../../../src/lib/doe/advice/judge.ts';
import { regularPlan } from '../../builders/random-process.ts';
import { buildBrief, buildInput, buildResult, planOf } from '../../builders/simulated-trial.ts';
import { createRandomSource } from './simulation.ts';

const REPETITIONS = 400;

const TRIALS = [
  { name: '16 + 3, 4 settings', free: 4, products: [], middles: 3 },
  { name: '16 + 3, 5 settings', free: 4, products: [[0, 1, 2, 3]], middles: 3 },
  {
    name: '16 + 3, 7 settings',
    free: 4,
    products: [
      [0, 1, 2],
      [1, 2, 3],
      [0, 2, 3],
    ],
    middles: 3,
  },
  { name: '32 + 4, 5 settings', free: 5, products: [], middles: 4 },
  {
    name: '32 + 4, 7 settings',
    free: 5,
    products: [
      [0, 1, 2, 3],
      [0, 1, 3, 4],
    ],
    middles: 4,
  },
];

/** One row a trial: name, then shortest and median times. */
export function measureTimings(): string[][] {
  const random = createRandomSource(1);
  return TRIALS.map(({ name, free, products, middles }) => {
    const factors = free + products.length;
    const brief = buildBrief(factors);
    const points = [
      ...regularPlan(free, products),
      ...Array.from({ length: middles }, () => new Array<number>(factors).fill(0)),
    ];
    const input = buildInput(
      brief,
      points.map((x, index) => ({ x, order: index + 1, y: 35 + 2 * (x[0] ?? 0) + random.normal() })),
    );
    const plan = planOf(input);
    const times = Array.from({ length: REPETITIONS }, () => {
      const start = performance.now();
      const results = [buildResult(brief.response, input)];
      const analyzed = performance.now();
      judge(brief, plan, results);
      const judged = performance.now();
      bestBet(brief, results);
      return [analyzed - start, judged - analyzed, performance.now() - judged];
    }).slice(REPETITIONS / 4);
    const steps = [0, 1, 2].map((step) => {
      const sorted = times.map((time) => time[step] ?? 0).sort((first, second) => first - second);
      return { shortest: sorted[0] ?? 0, median: sorted[sorted.length >> 1] ?? 0 };
    });
    const total = Math.min(...times.map((time) => time.reduce((sum, step) => sum + step, 0)));
    return [
      name,
      ...steps.map(({ shortest, median }) => `${shortest.toFixed(2)} / ${median.toFixed(2)}`),
      total.toFixed(2),
    ];
  });
}
