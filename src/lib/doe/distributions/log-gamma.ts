// Coefficients of Godfrey's evaluation of the Lanczos series with g = 607/128 and 15 terms (P. Godfrey, 2001; Lanczos, 1964).
const g = 607 / 128;
const series = [
  57.15623566586292, -59.59796035547549, 14.136097974741746, -0.4919138160976202, 0.00003399464998481189,
  0.00004652362892704858, -0.00009837447530487956, 0.0001580887032249125, -0.00021026444172410488,
  0.00021743961811521265, -0.0001643181065367639, 0.00008441822398385275, -0.000026190838401581408,
  0.0000036899182659531625,
];
const halfLogTwoPi = 0.5 * Math.log(2 * Math.PI);

/**
 * Natural logarithm of the gamma function for x > 0 (absolute error about 1e-14 for x up to 200).
 *
 * @throws RangeError when x is not above zero.
 */
export function logGamma(x: number): number {
  if (!(x > 0)) throw new RangeError(`logGamma: x must be above zero, got ${x}`);
  let sum = 0.9999999999999971;
  series.forEach((coefficient, index) => {
    sum += coefficient / (x + index + 1);
  });
  const shifted = x + g + 0.5;
  return (x + 0.5) * Math.log(shifted) - shifted + halfLogTwoPi + Math.log(sum / x);
}
