import type { PseudoErrorPlan } from './pseudo-error-limits.ts';
import table from './pseudo-error-power.json' with { type: 'json' };

/** How sure a call is: *likely* holds alone, *clear* when all effects of the result are judged together. */
export type Sureness = 'likely' | 'clear';

const rows = new Map(table.rows.map((row) => [`${row.contrasts}:${row.replicateDf}`, row]));

/** Whether power on pseudo error was tabulated for such a plan. */
export function hasPseudoErrorPower(plan: PseudoErrorPlan): boolean {
  return rows.has(`${plan.contrasts}:${plan.replicateDf}`);
}

/**
 * Probability of the call for a contrast of a true size, given in its own standard errors, when as many contrasts are active as the table assumes.
 *
 * @throws RangeError for plans that are not in the table.
 */
export function pseudoErrorPower(plan: PseudoErrorPlan, sureness: Sureness, size: number): number {
  const powers = powersOf(plan, sureness);
  const next = table.sizes.findIndex((tabulated) => tabulated > size);
  if (next < 0) return powers.at(-1) ?? 1;
  if (next === 0) return powers[0] ?? 0;
  const share = (size - at(table.sizes, next - 1)) / (at(table.sizes, next) - at(table.sizes, next - 1));
  return fromLogit(toLogit(at(powers, next - 1)) * (1 - share) + toLogit(at(powers, next)) * share);
}

/**
 * The true size, in standard errors of the contrast, at which the call is made with probability `power`.
 *
 * @throws RangeError for plans that are not in the table or a power beyond it.
 */
export function pseudoErrorSizeForPower(plan: PseudoErrorPlan, sureness: Sureness, power: number): number {
  const powers = powersOf(plan, sureness);
  const next = powers.findIndex((tabulated) => tabulated >= power);
  if (next < 1) throw new RangeError(`pseudoErrorSizeForPower: power must be within the table, got ${power}`);
  const [below, above] = [toLogit(at(powers, next - 1)), toLogit(at(powers, next))];
  const share = (toLogit(power) - below) / (above - below);
  return at(table.sizes, next - 1) * (1 - share) + at(table.sizes, next) * share;
}

function powersOf({ contrasts, replicateDf }: PseudoErrorPlan, sureness: Sureness): readonly number[] {
  const row = rows.get(`${contrasts}:${replicateDf}`);
  if (row === undefined)
    throw new RangeError(
      `powersOf: plan is not tabulated: ${contrasts} contrasts, ${replicateDf} replicate df`,
    );
  return row[sureness];
}

// Between the tabulated sizes the log-odds of power are nearly straight.
const toLogit = (power: number) => Math.log(Math.min(power, 1 - 1e-9) / (1 - Math.min(power, 1 - 1e-9)));
const fromLogit = (logit: number) => 1 / (1 + Math.exp(-logit));

function at(values: readonly number[], index: number): number {
  return values[index] ?? Number.NaN;
}
