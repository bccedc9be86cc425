/**
 * The x > 0 at which a monotone positive function takes a wanted value.
 *
 * Works on ln x and ln f(x), where tails of distributions are nearly straight: a bracket is widened around `start`, then narrowed by the secant
 * through its ends, with Illinois weighting and bisection so that it always shrinks (Dowell & Jarratt, 1971, BIT 11).
 *
 * @throws RangeError when no bracket is found between 1e-300 and 1e300.
 */
export function solveInLogarithms(f: (x: number) => number, wanted: number, start: number): number {
  const distance = (logX: number) => Math.log(f(Math.exp(logX))) - Math.log(wanted);
  let [low, high] = [Math.log(start), Math.log(start)];
  let lowDistance = distance(low);
  if (lowDistance === 0) return start;
  let highDistance = lowDistance;
  for (let step = 0.25; Math.sign(lowDistance) === Math.sign(highDistance); step *= 2) {
    if (step > 1400) throw new RangeError(`solveInLogarithms: ${wanted} is not reached`);
    low -= step;
    high += step;
    lowDistance = distance(low);
    highDistance = distance(high);
  }
  return Math.exp(narrow(distance, { low, high, lowDistance, highDistance }));
}

interface Bracket {
  low: number;
  high: number;
  lowDistance: number;
  highDistance: number;
}

function narrow(distance: (logX: number) => number, bracket: Bracket): number {
  let { low, high, lowDistance, highDistance } = bracket;
  let lastSide = 0;
  let repeats = 0;
  for (let iteration = 0; iteration < 200; iteration++) {
    const straight = Number.isFinite(lowDistance - highDistance) && repeats < 4;
    const middle = straight
      ? low + ((high - low) * lowDistance) / (lowDistance - highDistance)
      : low + (high - low) / 2;
    if (high - low <= 4e-16 * Math.max(1, Math.abs(middle)) || middle === low || middle === high)
      return middle;
    const here = distance(middle);
    if (here === 0) return middle;
    const side = Math.sign(here) === Math.sign(lowDistance) ? -1 : 1;
    repeats = side === lastSide ? repeats + 1 : 0;
    if (side < 0) {
      if (repeats > 0) highDistance /= 2;
      [low, lowDistance] = [middle, here];
    } else {
      if (repeats > 0) lowDistance /= 2;
      [high, highDistance] = [middle, here];
    }
    lastSide = side;
  }
  return low + (high - low) / 2;
}
