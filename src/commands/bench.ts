// How fast the core plans, against what the product promises: npm run bench. Ends with 1 when a limit is missed.
import { cpus } from 'node:os';
import { measureMedian } from './bench/measure-median.ts';
import { planningCases } from './bench/planning-cases.ts';

const results = planningCases.map((benchmark) => ({
  ...benchmark,
  ...measureMedian(benchmark.run, benchmark.rounds),
}));
const [processor] = cpus();

console.log(`${processor?.model ?? 'unknown processor'}, Node ${process.version}`);
console.log('median   slowest   limit    what');
for (const { median, slowest, limit, name } of results)
  console.log(
    `${milliseconds(median)} ${milliseconds(slowest)} ${milliseconds(limit)}  ${median <= limit ? '' : 'MISSED: '}${name}`,
  );

process.exitCode = results.every(({ median, limit }) => median <= limit) ? 0 : 1;

function milliseconds(value: number): string {
  return `${value.toFixed(2)} ms`.padStart(9);
}
