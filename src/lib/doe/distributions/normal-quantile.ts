import { normalDensity, normalUpperTail } from './normal.ts';

/**
 * The value below which a standard normal variable lies with probability p. For the upper side of a small p use `-normalQuantile(p)`, not 1 - p.
 *
 * Started by Hastings' approximation (Abramowitz & Stegun 26.2.23) and polished by Halley's method to full precision.
 *
 * @throws RangeError when p is not strictly between 0 and 1.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`normalQuantile: p must be between 0 and 1, got ${p}`);
  if (p === 0.5) return 0;
  const tail = Math.min(p, 1 - p);
  const t = Math.sqrt(-2 * Math.log(tail));
  let z =
    t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)));
  for (let step = 0; step < 3; step++) {
    const error = (normalUpperTail(z) - tail) / normalDensity(z);
    z += error / (1 - 0.5 * z * error);
  }
  return p < 0.5 ? -z : z;
}
