import { powerOfTwoSidedT } from '../distributions/power-of-two-sided-t.ts';
import { beliefOf } from './belief.ts';
import type { BestBet } from './verdict.ts';

/** Runs of each kind, and how likely they show the predicted gain. */
export interface CheckRuns {
  each: number;
  power: number;
}

const FEWEST = 3;
const MOST = 12;
const WANTED_POWER = 0.8;

/** As many runs at the new settings as at usual: three of each, or more if the predicted gain would otherwise be seen less than 8 times in 10. */
export function planCheckRuns({ basis }: Pick<BestBet, 'basis'>): CheckRuns {
  const gain = beliefOf(basis.gain).mean;
  const noise = Math.sqrt(basis.gain.parts.reduce((sum, part) => sum + part.weight * part.noiseVariance, 0));
  const powerWith = (each: number) =>
    noise > 0 && gain > 0
      ? powerOfTwoSidedT(gain / (noise * Math.sqrt(2 / each)), 2 * each - 2 + (basis.error?.df ?? 0))
      : gain > 0
        ? 1
        : 0;
  for (let each = FEWEST; each < MOST; each++) {
    const power = powerWith(each);
    if (power >= WANTED_POWER) return { each, power };
  }
  return { each: MOST, power: powerWith(MOST) };
}
