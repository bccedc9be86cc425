/**
 * Trigamma function, the second derivative of ln gamma, for x > 0: a fourth of it at (m - 1) / 2 is the variance of ln s of m normal values
 * (M.S. Bartlett & D.G. Kendall, 1946, JRSS Supplement 8, 128-138).
 *
 * Recurrence up to 12, then the asymptotic series (DLMF 5.15.8); relative error below 1e-14.
 *
 * @throws RangeError when x is not above zero.
 */
export function trigamma(x: number): number {
  if (!(x > 0)) throw new RangeError(`trigamma: x must be above zero, got ${x}`);
  let shifted = x;
  let sum = 0;
  for (; shifted < 12; shifted++) sum += 1 / shifted ** 2;
  const square = 1 / shifted ** 2;
  const series =
    1 / 6 -
    square *
      (1 / 30 -
        square * (1 / 42 - square * (1 / 30 - square * (5 / 66 - square * (691 / 2730 - (square * 7) / 6)))));
  return sum + 1 / shifted + square / 2 + (series * square) / shifted;
}
