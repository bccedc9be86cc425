import type { Brief, FactorSpec, NumberFactor } from '../brief.ts';
import { settingsOfRule } from './forbidden.ts';
import { tidyNumber } from './tidy-number.ts';
import { letterAt } from './words.ts';

/**
 * The brief of a trial whose ranges are moved on: each number setting by a share of its half range, given in coded units (+.5: half of the half range
 * up), cut at one half range, at the machine's limits and on the dial's steps. Widths stay; choices stay.
 *
 * Moving towards what a rule forbids could bring the new middle into what the rule meant, so at most one setting of a rule moves that way, and only
 * where another number setting of the rule stays. The hazard question is due again for every point of the new window.
 *
 * @throws RangeError when there are not as many steps as settings.
 */
export function moveWindow(brief: Brief, steps: readonly number[]): Brief {
  if (steps.length !== brief.factors.length)
    throw new RangeError(
      `moveWindow: steps must be one for each of ${brief.factors.length} settings, got ${steps.length}`,
    );
  const allowed = holdBackAtRules(brief, steps);
  return { ...brief, factors: brief.factors.map((factor, index) => moveFactor(factor, allowed[index] ?? 0)) };
}

function moveFactor(factor: FactorSpec, step: number): FactorSpec {
  if (factor.kind === 'choice') return factor;
  const halfRange = (factor.high - factor.low) / 2;
  const shift = onStep(factor, Math.max(-1, Math.min(1, step)) * halfRange);
  const low = tidyNumber(factor.low + shift);
  const high = tidyNumber(factor.high + shift);
  return { ...factor, low, high, usual: Math.min(high, Math.max(low, factor.usual)) };
}

/** Cut at the machine's limits, then down to whole steps of the dial. */
function onStep(
  { low, high, min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY, step }: NumberFactor,
  wanted: number,
): number {
  const shift = Math.max(min - low, Math.min(max - high, wanted));
  return step === undefined ? shift : Math.trunc(shift / step + Math.sign(shift) * 1e-9) * step;
}

function holdBackAtRules(brief: Brief, steps: readonly number[]): number[] {
  const allowed = [...steps];
  for (const rule of brief.forbidden) {
    const numbers = settingsOfRule(rule).filter((index) => brief.factors[index]?.kind === 'number');
    const towards = numbers.filter((index) => (allowed[index] ?? 0) * (rule[letterAt(index)] ?? 0) > 0);
    const mayMove = numbers.length > 1 ? 1 : 0;
    const byStep = towards.sort(
      (first, second) => Math.abs(allowed[second] ?? 0) - Math.abs(allowed[first] ?? 0),
    );
    for (const index of byStep.slice(mayMove)) allowed[index] = 0;
  }
  return allowed;
}
