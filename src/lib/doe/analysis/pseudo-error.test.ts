import { describe, expect, it } from 'vitest';
import { estimatePseudoErrors } from './pseudo-error.ts';

// Isatin yield, all 15 contrasts of a 2^4 (Davies 1954; Lenth 1989, Technometrics 31, 469-473), from tests/fixtures/reference/isatin-2-4.json.
const isatin = [
  -0.191, -0.021, -0.001, -0.076, 0.034, -0.066, 0.149, 0.274, -0.161, -0.251, -0.101, -0.026, -0.006, 0.124,
  0.019,
];

describe('estimatePseudoErrors', () => {
  it('is the published two-step median when nothing is left out', () => {
    // 1.5 times the median of all 15, 0.076: none is beyond 2.5 times 0.114.
    const errors = estimatePseudoErrors({ contrasts: isatin, replicateError: 0, replicateDf: 0 });
    expect(errors.overall).toBeCloseTo(0.114, 12);
  });

  it('leaves out each contrast from its own yardstick', () => {
    const base = { replicateError: 0, replicateDf: 0 };
    const quiet = [1, -2, 3, -4, 5, -6];
    const [, , , , , , big] = estimatePseudoErrors({ contrasts: [...quiet, 7], ...base }).leaveOneOut;
    const [, , , , , , huge] = estimatePseudoErrors({ contrasts: [...quiet, 7000], ...base }).leaveOneOut;
    expect(huge).toBe(big);
    expect(big).toBe(1.5 * 3.5);
  });

  it('counts one and two degrees of freedom of pure error as one and two contrasts', () => {
    const one = estimatePseudoErrors({ contrasts: [1, 2, 4, 5], replicateError: 3, replicateDf: 1 });
    expect(one.overall).toBe(1.5 * 3);
    // 2 sqrt(2) times the sine and cosine of 22.5 degrees: 1.0824 and 2.6131, of mean square 4.
    const two = estimatePseudoErrors({ contrasts: [1, 1.5, 4, 5], replicateError: 2, replicateDf: 2 });
    expect(two.overall).toBeCloseTo((1.5 * (1.5 + 2.613125929752753)) / 2, 12);
  });

  it('is zero when the contrasts are', () => {
    const errors = estimatePseudoErrors({ contrasts: [0, 0, 0, 0], replicateError: 0, replicateDf: 0 });
    expect(errors).toEqual({ overall: 0, leaveOneOut: [0, 0, 0, 0] });
  });

  it('refuses what it has no definition for', () => {
    expect(() => estimatePseudoErrors({ contrasts: [1, 2], replicateError: 1, replicateDf: 0 })).toThrow(
      RangeError,
    );
    expect(() => estimatePseudoErrors({ contrasts: [1, 2, 3], replicateError: 1, replicateDf: 3 })).toThrow(
      RangeError,
    );
  });
});
