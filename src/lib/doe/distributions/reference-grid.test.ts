import { describe, expect, test } from 'vitest';
import distributions from '../../../../tests/fixtures/reference/distributions.json' with { type: 'json' };
import noncentral from '../../../../tests/fixtures/reference/noncentral-t-mpmath.json' with { type: 'json' };
import power from '../../../../tests/fixtures/reference/power.json' with { type: 'json' };
import maximumModulus from '../../../../tests/fixtures/reference/studentized-maximum-modulus.json' with {
  type: 'json',
};
import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareUpperTail,
  fCdf,
  fUpperQuantile,
  fUpperTail,
  noncentralityForPower,
  noncentralTCdf,
  noncentralTUpperTail,
  normalCdf,
  normalQuantile,
  normalUpperTail,
  powerOfTwoSidedT,
  studentizedMaximumModulusQuantile,
  studentizedMaximumModulusUpperTail,
  studentTCdf,
  studentTQuantile,
  studentTTwoSided,
  studentTUpperQuantile,
  studentTUpperTail,
} from './index.ts';

/** The tables print degrees of freedom such as m/3 with 15 digits; the values were computed for the fraction itself. */
const exactly = (df: number) => Math.round(df * 3) / 3;

function worstRelativeError(pairs: [number, number][]): number {
  return Math.max(...pairs.map(([got, want]) => (want === 0 ? Math.abs(got) : Math.abs(got / want - 1))));
}

const worstAbsoluteError = (pairs: [number, number][]) =>
  Math.max(...pairs.map(([got, want]) => Math.abs(got - want)));

// R 4.2.2 and, where named exact, mpmath at 40 digits; see the notes in the tables.
describe('against the reference tables, 1e-12 relative', () => {
  test('Student t', () => {
    expect(
      worstRelativeError(
        distributions.pt.flatMap(({ df, t, lower, upper, twoSided }) => [
          [studentTCdf(t, exactly(df)), lower],
          [studentTUpperTail(t, exactly(df)), upper],
          [studentTTwoSided(t, exactly(df)), twoSided],
        ]),
      ),
    ).toBeLessThan(1e-12);
    expect(
      worstRelativeError(
        distributions.qt.map((row) => [studentTUpperQuantile(row.p, exactly(row.df)), row.qUpperExact]),
      ),
    ).toBeLessThan(1e-12);
  });

  test('quantiles behind the limits of Lenth (1989), at m/3 degrees of freedom', () => {
    expect(
      worstRelativeError(
        distributions.lenthQuantiles.flatMap(({ m, t975, tGamma }) => [
          [studentTUpperQuantile(0.025, m / 3), t975],
          [studentTQuantile((1 + 0.95 ** (1 / m)) / 2, m / 3), tGamma],
        ]),
      ),
    ).toBeLessThan(1e-12);
  });

  test('F', () => {
    expect(
      worstRelativeError(
        distributions.pf.flatMap(({ f, df1, df2, lower, upper }) => [
          [fCdf(f, df1, df2), lower],
          [fUpperTail(f, df1, df2), upper],
        ]),
      ),
    ).toBeLessThan(1e-12);
    expect(
      worstRelativeError(
        distributions.qf.map((row) => [fUpperQuantile(row.pUpper, row.df1, row.df2), row.qExact]),
      ),
    ).toBeLessThan(1e-12);
  });

  test('normal', () => {
    expect(
      worstRelativeError(
        distributions.pnorm.flatMap(({ z, lower, upper }) => [
          [normalCdf(z), lower],
          [normalUpperTail(z), upper],
        ]),
      ),
    ).toBeLessThan(1e-12);
    expect(worstRelativeError(distributions.qnorm.map(({ p, z }) => [normalQuantile(p), z]))).toBeLessThan(
      1e-12,
    );
  });

  test('chi-square, and its quantile as the inverse', () => {
    expect(
      worstRelativeError(distributions.pchisq.map(({ x, df, upper }) => [chiSquareUpperTail(x, df), upper])),
    ).toBeLessThan(1e-12);
    const back = [0.001, 0.1, 0.5, 0.9, 0.999].flatMap((p) =>
      [1, 2, 4, 7, 31].map((df): [number, number] => [chiSquareCdf(chiSquareQuantile(p, df), df), p]),
    );
    expect(worstRelativeError(back)).toBeLessThan(1e-12);
  });

  test('studentized maximum modulus', () => {
    expect(
      worstRelativeError(
        maximumModulus.rows.map(({ limit, k, df, upper }) => [
          studentizedMaximumModulusUpperTail(limit, k, df),
          upper,
        ]),
      ),
    ).toBeLessThan(1e-10);
    // Stoline & Ury (1979), upper 5 % point for 3 means and 5 degrees of freedom, from memory.
    expect(studentizedMaximumModulusQuantile(0.05, 3, 5)).toBeCloseTo(3.4, 2);
  });
});

describe('power', () => {
  test('non-central t, 1e-12 absolute against 40-digit quadrature', () => {
    expect(
      worstAbsoluteError(
        noncentral.pnct.flatMap(({ t, df, ncp, lower, upper }) => [
          [noncentralTCdf(t, exactly(df), ncp), lower],
          [noncentralTUpperTail(t, exactly(df), ncp), upper],
        ]),
      ),
    ).toBeLessThan(1e-12);
  });

  test('two-sided t test of one effect, 1e-10 absolute', () => {
    expect(
      worstAbsoluteError(power.power.map((row) => [powerOfTwoSidedT(row.ncp, row.v), row.power])),
    ).toBeLessThan(1e-10);
    expect(
      worstAbsoluteError(
        power.powerTTest.map((row) => [
          powerOfTwoSidedT((row.delta / row.sd) * Math.sqrt(row.nPerGroup / 2), row.df),
          row.power,
        ]),
      ),
    ).toBeLessThan(1e-10);
  });

  test('detectable effects', () => {
    const pairs = power.detectable.map((row): [number, number] => {
      const limit = studentTUpperQuantile(0.025, row.v);
      return [noncentralityForPower(row.power, row.v, limit) * (2 / Math.sqrt(row.N)), row.deltaOverSigma];
    });
    expect(worstRelativeError(pairs)).toBeLessThan(1e-11);
  });
});
