import { describe, expect, it } from 'vitest';
import { analyzeSteadiness, varianceOfLogSpread } from './steadiness.ts';

const factors = [{ letter: 'A', kind: 'number' as const }];

describe('analyzeSteadiness', () => {
  it('knows the variance of ln(s): a quarter of trigamma', () => {
    // trigamma(2) = pi^2 / 6 - 1 and trigamma(1/2) = pi^2 / 2 (Abramowitz & Stegun 6.4).
    expect(varianceOfLogSpread(5)).toBeCloseTo((Math.PI ** 2 / 6 - 1) / 4, 12);
    expect(varianceOfLogSpread(2)).toBeCloseTo(Math.PI ** 2 / 8, 12);
  });

  it('estimates the ratio of spreads, with theory as a floor of the error', () => {
    const parts = (sd: number) => [-2, -1, 0, 1, 2].map((step) => 10 + sd * step);
    const runs = [-1, 1, -1, 1, -1, 1].map((x) => ({ x: [x], y: 10, parts: parts(x > 0 ? 3 : 1) }));
    const analysis = analyzeSteadiness({ factors, runs }, 0);
    expect(Math.exp(analysis?.terms[0]?.effect ?? 0)).toBeCloseTo(3, 9);
    expect(analysis?.error.sd).toBeCloseTo(Math.sqrt(varianceOfLogSpread(5)), 12);
  });

  it('lets a coarse gauge stand for spread that cannot be seen, and asks for five parts', () => {
    const same = [-1, 1, -1, 1, -1, 1].map((x) => ({ x: [x], y: 10, parts: [10, 10, 10, 10, 10] }));
    expect(analyzeSteadiness({ factors, runs: same }, 0.5)?.intercept.coefficient).toBeCloseTo(
      Math.log(0.25 / 12) / 2,
      9,
    );
    expect(analyzeSteadiness({ factors, runs: same }, 0)).toBeNull();
    const four = same.map((run) => ({ ...run, parts: run.parts.slice(1) }));
    expect(analyzeSteadiness({ factors, runs: four }, 0.5)).toBeNull();
  });
});
