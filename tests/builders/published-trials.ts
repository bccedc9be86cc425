import type { Brief, FactorSpec, ResponseSpec } from '../../src/lib/doe/index.ts';
import { type Example, referenceExamples } from './reference-examples.ts';
import type { MadeTrial, Reading } from './verdict-view.ts';

const names = ['Heat', 'Pressure', 'Mix', 'Stir speed', 'Feed'];
const units = ['°C', 'bar', '%', 'rpm', 'kg'];

function find(id: string): Example {
  const example = referenceExamples.find((each) => each.id === id);
  if (!example) throw new RangeError(`publishedTrial: no example ${id}`);
  return example;
}

function toFactor(kind: string, place: number): FactorSpec {
  const name = names[place] ?? '';
  return kind === 'categorical'
    ? { kind: 'choice', name, low: 'One', high: 'Two', usual: 'low' }
    : { kind: 'number', name, unit: units[place] ?? '', low: 10, high: 20, usual: 10 };
}

/** A published factorial with its own readings, as if a shop had entered it, under names of the shop's kind. */
export function publishedTrial(
  id: string,
  response: Partial<ResponseSpec>,
  change: (reading: Reading, coded: readonly number[], place: number) => Reading = (reading) => reading,
): MadeTrial {
  const { factors = [], runs } = find(id);
  const brief: Brief = {
    response: { name: 'flow', unit: 'l/h', kind: 'measured', goal: 'more', worthHaving: 5, ...response },
    watch: [],
    factors: factors.map(({ kind }, place) => toFactor(kind, place)),
    forbidden: [],
    budget: { maxRuns: 64, minutesPerRun: 12 },
    noise: null,
  };
  const coded = runs.map((run) => factors.map(({ letter }) => run.coded?.[letter] ?? 0));
  return {
    brief,
    plan: runs.map((run, index) => {
      const x = coded[index] ?? [];
      return {
        order: index + 1,
        standard: index + 1,
        block: run.block ?? 1,
        group: x.join(' '),
        center: run.centre ?? false,
        coded: x,
        actual: brief.factors.map((factor, place) => {
          const level = x[place] ?? 0;
          if (factor.kind === 'number') return 15 + 5 * level;
          return level > 0 ? factor.high : factor.low;
        }),
      };
    }),
    readings: runs.map(({ y, n }, index) => [
      change({ y, ...(n === undefined ? {} : { n }) }, coded[index] ?? [], index),
    ]),
  };
}
