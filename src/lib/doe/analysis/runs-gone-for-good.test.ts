import { describe, expect, it } from 'vitest';
import { regularPlan } from '../../../../tests/builders/random-process.ts';
import { buildBrief, buildInput } from '../../../../tests/builders/simulated-trial.ts';
import { analyze } from './analyze.ts';

/** Readings that only A moves; the runs at `gone` were never made. */
function readTrial(points: readonly number[][], gone: readonly number[], factors: number) {
  return analyze(
    buildInput(
      buildBrief(factors),
      points.map((x, index) =>
        gone.includes(index)
          ? { x, y: null, end: 'notRun' as const }
          : { x, y: 10 + 3 * (x[0] ?? 0) + (index % 3) / 100 },
      ),
    ),
  );
}

const middles = (factors: number, count: number) =>
  Array.from({ length: count }, () => new Array<number>(factors).fill(0));

describe('runs that are gone for good', () => {
  const half = [...regularPlan(3, [[0, 1, 2]]), ...middles(4, 4)];

  it('cost pairs, the last by letter first, and never a main effect', () => {
    const kept = (gone: number[]) => readTrial(half, gone, 4).terms.map(({ term }) => term);
    expect(kept([])).toEqual(['A', 'B', 'C', 'D', 'AB', 'AC', 'AD']);
    expect(kept([0])).toEqual(['A', 'B', 'C', 'D', 'AB', 'AC']);
    expect(kept([0, 5])).toEqual(['A', 'B', 'C', 'D', 'AB']);
    expect(kept([0, 3, 5])).toEqual(['A', 'B', 'C', 'D']);
  });

  it('leave the error to the repeats that are left, and estimates that still hold', () => {
    const analysis = readTrial(half, [0], 4);
    expect(analysis.n).toBe(11);
    expect(analysis.error).toMatchObject({ source: 'replicates', df: 3 });
    expect(analysis.terms[0]?.effect).toBeCloseTo(6, 1);
  });

  it('first cost what was free for error: terms of three letters and up', () => {
    const full = [...regularPlan(4), ...middles(4, 3)];
    const whole = readTrial(full, [], 4);
    const short = readTrial(full, [15], 4);
    expect(short.terms.map(({ term }) => term)).toEqual(whole.terms.map(({ term }) => term));
    expect(whole.error).toMatchObject({ source: 'replicates+high-order', df: 7 });
    expect(short.error).toMatchObject({ source: 'replicates+high-order', df: 6 });
  });

  it('among the repeats leave too little to judge by, and then nothing is judged', () => {
    const analysis = readTrial(half, [8, 9, 10, 0], 4);
    expect(analysis.error.source).toBe('none');
    for (const term of analysis.terms) expect(term).toMatchObject({ p: null, ci: null });
  });
});
