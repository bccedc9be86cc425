import { describe, expect, it } from 'vitest';
import { decideErrorPlan, type LayoutRun } from './error-plan.ts';

const LETTERS = ['A', 'B', 'C', 'D', 'E'];

/** Corners of a full plan in `free` settings, further settings by products of columns such as [0, 1, 2] for D = ABC. */
function corners(free: number, products: number[][] = []): LayoutRun[] {
  return Array.from({ length: 2 ** free }, (_, run) => {
    const x = Array.from({ length: free }, (_, factor) => ((run >> factor) & 1 ? 1 : -1));
    return { x: [...x, ...products.map((columns) => columns.reduce((sign, c) => sign * (x[c] ?? 1), 1))] };
  });
}

function middles(factors: number, count: number): LayoutRun[] {
  return Array.from({ length: count }, () => ({ x: new Array<number>(factors).fill(0), center: true }));
}

const decide = (runs: LayoutRun[]) => decideErrorPlan(LETTERS.slice(0, runs[0]?.x.length), runs);

describe('decideErrorPlan', () => {
  it('pools pure error with the three-factor interaction of a full plan in three settings', () => {
    expect(decide([...corners(3), ...middles(3, 3)])).toEqual({
      rung: 'replicates+high-order',
      df: 3,
      replicateDf: 2,
      highOrderTerms: ['ABC'],
      contrasts: 7,
    });
  });

  it('uses pure error alone where every column holds a pair', () => {
    expect(decide([...corners(3, [[0, 1, 2]]), ...middles(4, 4)])).toMatchObject({
      rung: 'replicates',
      df: 3,
    });
    expect(decide([...corners(4, [[0, 1, 2, 3]]), ...middles(5, 4)])).toMatchObject({
      rung: 'replicates',
      df: 3,
      contrasts: 15,
    });
  });

  it('falls back to pseudo error with fewer repeats', () => {
    const half = corners(3, [[0, 1, 2]]);
    expect(decide([...half, ...middles(4, 3)])).toMatchObject({ rung: 'pseudo+replicates', df: null });
    expect(decide([...half, ...middles(4, 1)])).toMatchObject({ rung: 'pseudo', replicateDf: 0 });
    expect(decide(corners(3))).toMatchObject({ rung: 'pseudo', contrasts: 7 });
  });

  it('gives up where pseudo error has no right: few contrasts, a lost run, an unequal block', () => {
    expect(decide(corners(2)).rung).toBe('none');
    expect(decide(corners(3, [[0, 1, 2]]).slice(1)).rung).toBe('none');
    const blocked = corners(3, [[0, 1, 2]]).map((run, index) => ({ ...run, block: index < 3 ? 1 : 2 }));
    expect(decide(blocked).rung).toBe('none');
  });

  it('counts blocks before repeats', () => {
    const runs = [...corners(2), ...corners(2)].map((run, index) => ({ ...run, block: index < 4 ? 1 : 2 }));
    expect(decide(runs)).toMatchObject({ rung: 'replicates', df: 3, replicateDf: 3 });
  });

  it('keeps middle runs at two values of a choice from counting their difference as error', () => {
    const middle = [-1, -1, 1, 1].map((choice) => ({ x: [0, 0, choice], center: true }));
    expect(decide([...corners(3), ...middle])).toMatchObject({ replicateDf: 2, df: 3 });
  });

  it('splits the error of whole plots and of the runs within', () => {
    // Whole plots of two runs: C is hard to change, and AB changes with the whole plot.
    const pairs = corners(3).map((run, index) => ({
      ...run,
      wholePlot: (run.x[2] === 1 ? 2 : 0) + ((index ^ (index >> 1)) & 1),
    }));
    expect(decide(pairs).strata).toMatchObject([
      { name: 'whole', rung: 'replicates+high-order', df: 1, replicateDf: 0, highOrderTerms: ['ABC'] },
      { name: 'sub', rung: 'none', df: null },
    ]);
    const repeated = [...corners(3), ...corners(3)].map((run, index) => ({
      ...run,
      wholePlot: (index >> 2) + 1,
    }));
    expect(decide(repeated).strata).toMatchObject([
      { name: 'whole', rung: 'replicates', df: 2, replicateDf: 2 },
      { name: 'sub', rung: 'replicates+high-order', replicateDf: 6, df: 7 },
    ]);
  });
});
