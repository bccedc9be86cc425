import { studentTQuantile } from '../distributions/student-t.ts';
import type { LenthLimits } from './analysis.ts';
import { estimatePseudoErrors } from './pseudo-error.ts';

/**
 * Limits for the effects of an unreplicated plan as published (R. V. Lenth, 1989, Technometrics 31, 469-473), shown beside those used; with
 * t quantiles on a third of the contrasts as degrees of freedom. null below three contrasts.
 */
export function computeLenthLimits(effects: readonly number[], alpha: number): LenthLimits | null {
  const m = effects.length;
  if (m < 3) return null;
  const sizes = effects.map(Math.abs).sort((first, second) => first - second);
  const upper = sizes[m >> 1] ?? 0;
  const s0 = 1.5 * (m % 2 === 1 ? upper : (upper + (sizes[(m >> 1) - 1] ?? 0)) / 2);
  const { overall: pse } = estimatePseudoErrors({ contrasts: effects, replicateError: 0, replicateDf: 0 });
  const d = m / 3;
  const gamma = (1 + (1 - alpha) ** (1 / m)) / 2;
  return {
    s0,
    pse,
    d,
    me: studentTQuantile(1 - alpha / 2, d) * pse,
    sme: studentTQuantile(gamma, d) * pse,
  };
}
