import type { Letter } from '../brief.ts';
import type { LayoutRun } from '../design/error-plan.ts';

/** A run as a place among the settings: without its reading. */
export interface LayoutPoint extends LayoutRun {
  x: readonly number[];
  center: boolean;
}

/**
 * Where the runs with readings are. Everything that depends on this alone (ranks, factored models, aliases, the error plan) is worked out once and
 * kept with it: a trial's results share it, and so does every new look at them.
 */
export interface Layout {
  letters: readonly Letter[];
  points: readonly LayoutPoint[];
  /** One a run, averaging 1; undefined: all equal. */
  weights: readonly number[] | undefined;
  /** What `what` names, computed at most once for this layout. */
  remember<Value>(what: string, compute: () => Value): Value;
}

const CAPACITY = 32;
const layouts = new Map<string, Layout>();

/** The layout of these points: the same object for the same points. */
export function layoutOf(
  letters: readonly Letter[],
  points: readonly LayoutPoint[],
  weights: readonly number[] | undefined,
): Layout {
  const key = [
    letters.join(''),
    ...points.map(({ x, block, wholePlot, center }) => `${x.join(' ')};${block};${wholePlot};${center}`),
    weights?.join(' '),
  ].join('|');
  const known = layouts.get(key);
  if (known !== undefined) return known;
  const found = new Map<string, unknown>();
  const layout: Layout = {
    letters,
    points,
    weights,
    remember<Value>(what: string, compute: () => Value): Value {
      if (!found.has(what)) found.set(what, compute());
      // Each name is asked for with one kind of value only.
      return found.get(what) as Value;
    },
  };
  if (layouts.size >= CAPACITY) layouts.clear();
  layouts.set(key, layout);
  return layout;
}
