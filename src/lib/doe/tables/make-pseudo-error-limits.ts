// Writes the table of pseudo-error tails to standard output:
//   node --import tsx src/lib/doe/tables/make-pseudo-error-limits.ts > src/lib/doe/tables/pseudo-error-limits.json
// Arguments: number of draws a row (2,000,000 if not given).
import { GRID, simulatePseudoErrorTails } from './simulate-pseudo-error.ts';

const draws = Number(process.argv[2] ?? 2_000_000);
const seed = 20_260_101;

const rounded = (tail: number[]) => tail.map((value) => Number(value.toPrecision(6)));

const rows = [];
for (let contrasts = 7; contrasts <= 15; contrasts++) {
  for (const replicateDf of [0, 1, 2]) {
    const tails = simulatePseudoErrorTails({
      contrasts,
      replicateDf,
      draws,
      seed: seed + 10 * contrasts + replicateDf,
    });
    rows.push({
      contrasts,
      replicateDf,
      single: rounded(tails.single),
      outside: rounded(tails.outside),
      family: rounded(tails.family),
      familyAndOutside: rounded(tails.familyAndOutside),
    });
    process.stderr.write(`${contrasts} contrasts, ${replicateDf} replicate df\n`);
  }
}
process.stdout.write(
  `${JSON.stringify({ draws, seed, grid: GRID, rows }).replaceAll('{"contrasts"', '\n{"contrasts"')}\n`,
);
