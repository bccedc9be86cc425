import { describe, expect, it } from 'vitest';
import { hasPseudoErrorLimits, pseudoErrorLimit, pseudoErrorUpperTail } from './pseudo-error-limits.ts';
import { GRID, simulatePseudoErrorTails } from './simulate-pseudo-error.ts';

describe('tails on pseudo error', () => {
  it('are what a fresh simulation finds', () => {
    const plan = { contrasts: 7, replicateDf: 2 };
    const draws = 20_000;
    const fresh = simulatePseudoErrorTails({ ...plan, draws, seed: 5 });
    for (const statistic of ['single', 'outside', 'family', 'familyAndOutside'] as const) {
      for (let index = 12; index <= 22; index += 2) {
        const p = pseudoErrorUpperTail(plan, statistic, Math.exp(GRID.start + index * GRID.step));
        const spread = 5 * Math.sqrt((p * (1 - p)) / draws) + 1e-4;
        expect(Math.abs(Math.exp(fresh[statistic][index] ?? 0) - p)).toBeLessThan(spread);
      }
    }
  });

  it('fall steadily, and limits undo them', () => {
    const plan = { contrasts: 15, replicateDf: 0 };
    let before = 1;
    for (let t = 0.05; t < 1e4; t *= 1.3) {
      const p = pseudoErrorUpperTail(plan, 'single', t);
      expect(p).toBeLessThan(before);
      expect(p).toBeGreaterThan(0);
      before = p;
    }
    expect(pseudoErrorUpperTail(plan, 'family', pseudoErrorLimit(plan, 'family', 0.05))).toBeCloseTo(0.05, 9);
  });

  it('exist for 7 to 15 contrasts and at most two degrees of freedom', () => {
    expect(hasPseudoErrorLimits({ contrasts: 6, replicateDf: 0 })).toBe(false);
    expect(hasPseudoErrorLimits({ contrasts: 15, replicateDf: 3 })).toBe(false);
    expect(() => pseudoErrorUpperTail({ contrasts: 6, replicateDf: 0 }, 'single', 1)).toThrow(RangeError);
    expect(() => pseudoErrorLimit({ contrasts: 7, replicateDf: 0 }, 'single', 1)).toThrow(RangeError);
  });
});
