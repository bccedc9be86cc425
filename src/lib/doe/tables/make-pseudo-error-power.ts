// Writes the table of promises on pseudo error to standard output:
//   node --import tsx src/lib/doe/tables/make-pseudo-error-power.ts > src/lib/doe/tables/pseudo-error-power.json
// Arguments: number of draws a row (40,000 if not given).
import { SIZES, simulatePseudoErrorPower } from './simulate-pseudo-error-power.ts';

const draws = Number(process.argv[2] ?? 40_000);
const seed = 20_260_201;

const rows = [];
for (let contrasts = 7; contrasts <= 15; contrasts++) {
  for (const replicateDf of [0, 1, 2]) {
    const power = simulatePseudoErrorPower({
      contrasts,
      replicateDf,
      draws,
      seed: seed + 10 * contrasts + replicateDf,
    });
    rows.push({ contrasts, replicateDf, ...power });
    process.stderr.write(`${contrasts} contrasts, ${replicateDf} replicate df\n`);
  }
}
process.stdout.write(
  `${JSON.stringify({ draws, seed, sizes: SIZES, rows }).replaceAll('{"contrasts"', '\n{"contrasts"')}\n`,
);
