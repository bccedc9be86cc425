import { describe, expect, test } from 'vitest';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import {
  chiSquareUpperTail,
  fUpperTail,
  logGamma,
  noncentralTCdf,
  noncentralTUpperTail,
  normalUpperTail,
  regularizedIncompleteBeta,
  studentizedMaximumModulusQuantile,
  studentizedMaximumModulusUpperTail,
  studentTCdf,
  studentTTwoSided,
  studentTUpperQuantile,
  studentTUpperTail,
} from './index.ts';

const df = fc.integer({ min: 1, max: 60 });
const size = fc.double({ min: 0.05, max: 12, noNaN: true });

function expectClose(got: number, want: number, relative: number): void {
  expect(Math.abs(got - want)).toBeLessThanOrEqual(relative * Math.abs(want));
}

describe('identities that hold whatever the arguments', () => {
  test('the gamma function steps up by its argument', () => {
    fc.assert(
      fc.property(size, (x) => {
        expect(Math.abs(logGamma(x + 1) - logGamma(x) - Math.log(x))).toBeLessThan(1e-13);
      }),
    );
  });

  test('the normal tail is half the chi-square tail of the square, by a different algorithm', () => {
    fc.assert(
      fc.property(size, (z) => expectClose(normalUpperTail(z), 0.5 * chiSquareUpperTail(z * z, 1), 1e-13)),
    );
  });

  test('t squared is F with one degree of freedom; beta is its own mirror', () => {
    fc.assert(
      fc.property(size, df, (t, v) => {
        expectClose(studentTTwoSided(t, v), fUpperTail(t * t, 1, v), 1e-15);
        const x = t / 13;
        expect(
          regularizedIncompleteBeta(v / 2, 0.5, x) + regularizedIncompleteBeta(0.5, v / 2, 1 - x, x),
        ).toBeCloseTo(1, 13);
      }),
    );
  });

  test('without non-centrality the non-central t is Student t', () => {
    fc.assert(
      fc.property(size, df, (t, v) => {
        expect(noncentralTUpperTail(t, v, 0)).toBeCloseTo(studentTUpperTail(t, v), 12);
        expect(noncentralTCdf(t, v, 0)).toBeCloseTo(studentTCdf(t, v), 12);
      }),
    );
  });

  test('one mean: maximum modulus is |t|; more means: between t and Bonferroni', () => {
    fc.assert(
      fc.property(size, df, fc.integer({ min: 2, max: 30 }), (t, v, k) => {
        const one = studentTTwoSided(t, v);
        expectClose(studentizedMaximumModulusUpperTail(t, 1, v), one, 1e-11);
        const all = studentizedMaximumModulusUpperTail(t, k, v);
        expect(all).toBeGreaterThan(one);
        expect(all).toBeLessThanOrEqual(k * one * (1 + 1e-12));
      }),
    );
  });

  test('infinite degrees of freedom: Sidak’s product', () => {
    const limit = studentizedMaximumModulusQuantile(0.05, 7, Number.POSITIVE_INFINITY);
    expect(2 * normalUpperTail(limit)).toBeCloseTo(1 - 0.95 ** (1 / 7), 14);
  });

  test('quantiles invert their tails, both sides, also far out', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 0.9999, noNaN: true }), df, (p, v) =>
        expectClose(studentTUpperTail(studentTUpperQuantile(p, v), v), p, 1e-11),
      ),
    );
  });
});

test('nonsense is a RangeError that names the function', () => {
  expect(() => studentTUpperQuantile(0, 3)).toThrow(/studentTUpperQuantile: upper/);
  expect(() => studentTUpperTail(1, 0)).toThrow(RangeError);
  expect(() => fUpperTail(1, Number.NaN, 2)).toThrow(RangeError);
  expect(() => logGamma(-1)).toThrow(/logGamma: x/);
  expect(() => studentizedMaximumModulusUpperTail(1, 1.5, 3)).toThrow(/k must be/);
  expect(() => noncentralTUpperTail(1, -2, 0)).toThrow(/df must be/);
});
