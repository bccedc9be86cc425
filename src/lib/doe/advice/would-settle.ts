import type { Analysis, TermEstimate } from '../analysis/analysis.ts';
import { studentTLimit } from '../analysis/yardstick.ts';
import type { CallContext } from './calls.ts';

const MOST_RUNS = 200;

/**
 * Further runs of the same kind after which an open call would be settled, if the estimate and the noise stay: enough that the interval either leaves
 * zero or fits inside -W..W, whichever is nearer. null: there is no error to go by, or it would take hundreds.
 */
export function runsToSettle(term: TermEstimate, context: CallContext): number | null {
  const { se, effect } = term;
  if (se === null || !(se > 0)) return null;
  const size = Math.abs(effect);
  const room = Math.max(size, context.worthHaving - size);
  const corners = context.analysis.n;
  const df = degreesNow(context.analysis);
  for (let runs = 1; runs <= MOST_RUNS; runs++) {
    const limit = studentTLimit(df + runs, context.analysis.basis.alpha);
    if (limit * se * Math.sqrt(corners / (corners + runs)) <= room) return runs;
  }
  return null;
}

/** Every further run is a repeat; a pseudo error brings nothing along. */
function degreesNow({ error }: Analysis): number {
  return error.df ?? 0;
}
