import { studentTUpperTail } from '../distributions/student-t.ts';
import { z } from '../zod.ts';

/** A quantity as a mixture of t distributions, as plain numbers: the variance of a part is its `spread` times its noise variance. */
export const beliefMixtureSchema = z.object({
  df: z.number(),
  parts: z.array(
    z.object({ weight: z.number(), mean: z.number(), spread: z.number(), noiseVariance: z.number() }),
  ),
});

export type BeliefMixture = z.infer<typeof beliefMixtureSchema>;

export interface Belief {
  mean: number;
  sd: number;
  /** The value that the quantity stays below with probability `p`. */
  quantile(p: number): number;
  /** Probability of being above `limit`. */
  above(limit: number): number;
  /** The middle 95 %. */
  interval(): [number, number];
}

/**
 * A mixture as a distribution.
 *
 * @param extraNoise variance added, in units of the noise variance of a run: 1 for one new run, 1/n + 1/n for the difference of two means
 * @param sign -1 turns the quantity round
 */
export function beliefOf(mixture: BeliefMixture, extraNoise = 0, sign: 1 | -1 = 1): Belief {
  const { df } = mixture;
  const parts = mixture.parts.map((part) => ({
    weight: part.weight,
    mean: sign * part.mean,
    scale: Math.sqrt(part.noiseVariance * (part.spread + extraNoise)),
  }));
  const mean = parts.reduce((sum, part) => sum + part.weight * part.mean, 0);
  const inflation = df > 2 ? df / (df - 2) : 3;
  const sd = Math.sqrt(
    parts.reduce(
      (sum, part) => sum + part.weight * (part.scale ** 2 * inflation + (part.mean - mean) ** 2),
      0,
    ),
  );
  const above = (limit: number) =>
    parts.reduce((sum, part) => sum + part.weight * upperTail(part, limit, df), 0);
  const quantile = (p: number) => (sd > 0 ? mean + sd * quantileInSds((z) => above(mean + z * sd), p) : mean);
  return { mean, sd, above, quantile, interval: () => [quantile(0.025), quantile(0.975)] };
}

function upperTail(part: { mean: number; scale: number }, limit: number, df: number): number {
  if (part.scale > 0) return studentTUpperTail((limit - part.mean) / part.scale, df);
  return part.mean > limit ? 1 : 0;
}

/**
 * Where an upper tail falls to 1 - p: a bracket, then false position with the stale end's weight halved (Dowell & Jarratt 1971, BIT 11), to a
 * millionth of a standard deviation.
 */
function quantileInSds(above: (z: number) => number, p: number): number {
  const excess = (z: number) => above(z) - (1 - p);
  let [low, high] = [-3, 3];
  let [atLow, atHigh] = [excess(low), excess(high)];
  for (; atLow < 0 && low > -1e6; low *= 3) atLow = excess(3 * low);
  for (; atHigh > 0 && high < 1e6; high *= 3) atHigh = excess(3 * high);
  let stale = 0;
  for (let step = 0; step < 100 && high - low > 1e-6; step++) {
    const at = (low * atHigh - high * atLow) / (atHigh - atLow);
    const here = excess(at);
    if (Math.abs(here) < 1e-9) return at;
    if (here > 0) {
      [low, atLow] = [at, here];
      if (stale === 1) atHigh /= 2;
      stale = 1;
    } else {
      [high, atHigh] = [at, here];
      if (stale === -1) atLow /= 2;
      stale = -1;
    }
  }
  return (low + high) / 2;
}
