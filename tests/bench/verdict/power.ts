import { estimatePseudoErrors } from '../../../src/lib/doe/analysis/pseudo-error.ts';
import { pseudoErrorLimit } from '../../../src/lib/doe/tables/pseudo-error-limits.ts';
import type { RandomSource } from './simulation.ts';

/** Power of *likely* on pseudo error with the contrast under test left out of its yardstick, as here, and left in, as published. */
export interface PseudoPower {
  leftOut: number[];
  leftIn: number[];
}

/** Power at effects of so many run-to-run standard deviations; both yardsticks with limits that nothing active passes 5 % of the time. */
export function comparePseudoPower(question: {
  contrasts: number;
  replicateDf: number;
  active: number;
  corners: number;
  sizes: readonly number[];
  experiments: number;
  random: RandomSource;
}): PseudoPower {
  const { contrasts, replicateDf, active, corners, sizes, experiments, random } = question;
  /** Sizes of the first contrast over both yardsticks. */
  const draw = (size: number): [number, number] => {
    const values = Array.from(
      { length: contrasts },
      (_, place) => (place < active ? size : 0) + random.normal(),
    );
    let ss = 0;
    for (let df = 0; df < replicateDf; df++) ss += random.normal() ** 2;
    const errors = estimatePseudoErrors({
      contrasts: values,
      replicateError: replicateDf === 0 ? 0 : Math.sqrt(ss / replicateDf),
      replicateDf,
    });
    const first = Math.abs(values[0] ?? 0);
    return [first / (errors.leaveOneOut[0] ?? Number.POSITIVE_INFINITY), first / errors.overall];
  };
  const nothing = Array.from({ length: experiments }, () => draw(0)[1]).sort((one, other) => one - other);
  const limitIn = nothing[Math.floor(0.95 * experiments)] ?? Number.POSITIVE_INFINITY;
  const limitOut = pseudoErrorLimit({ contrasts, replicateDf }, 'single', 0.05);
  const found: PseudoPower = { leftOut: [], leftIn: [] };
  for (const size of sizes) {
    let [seenOut, seenIn] = [0, 0];
    for (let experiment = 0; experiment < experiments; experiment++) {
      const [out, inside] = draw((size * Math.sqrt(corners)) / 2);
      if (out > limitOut) seenOut++;
      if (inside > limitIn) seenIn++;
    }
    found.leftOut.push(seenOut / experiments);
    found.leftIn.push(seenIn / experiments);
  }
  return found;
}
