import type { Brief } from '../brief.ts';
import { isForbidden } from '../design/forbidden.ts';
import { beliefOf } from './belief.ts';
import type { Failures } from './failures.ts';
import type { ResultModel } from './result-model.ts';

export interface ChoiceQuestion {
  brief: Brief;
  /** The main result, then the watched ones. */
  models: readonly ResultModel[];
  usual: readonly number[];
  candidates: readonly (readonly number[])[];
  failures: Failures;
  /** How much expected figure, on the scale of the analysis, a setting must bring to be changed at all. */
  tolerance: number;
  /** Whether settings may be put back to usual one by one. */
  mayMix: boolean;
}

export interface Choice {
  x: number[];
  /** Whether every limit holds with the probability asked for. */
  limitsHold: boolean;
}

/** The allowed settings with the best expectation among those whose limits hold; where none do, those whose limits most likely hold. */
export function chooseSettings(question: ChoiceQuestion): Choice {
  const { models, usual, candidates } = question;
  const merit = meritOf(question);
  const limited = models.filter((model) => model.spec.lower !== undefined || model.spec.upper !== undefined);
  const holds = (x: readonly number[]) =>
    limited.every((model) => (model.limitsHold(x) ?? 1) >= (model.spec.limitProbability ?? 0.9));
  const together = (x: readonly number[]) =>
    limited.reduce((product, model) => product * (model.limitsHold(x) ?? 1), 1);

  // The best that holds is the first that holds, going down from the best: probabilities are dear, expectations are not.
  const best = candidates
    .map((x) => ({ x, value: merit(x) }))
    .sort((first, second) => second.value - first.value)
    .find(({ x }) => holds(x))?.x;
  if (best === undefined) {
    const ends = candidates.filter((x) => x === candidates[0] || x.every((value) => Math.abs(value) === 1));
    return { x: [...(bestBy(ends, together) ?? usual)], limitsHold: false };
  }
  return { x: question.mayMix ? putBack(question, best, merit, holds) : [...best], limitsHold: true };
}

/** Bigger is better: the expected figure the good way; for a target minus the root of the expected squared distance. */
export function meritOf({
  brief,
  models,
}: Pick<ChoiceQuestion, 'brief' | 'models'>): (x: readonly number[]) => number {
  const [main] = models;
  if (main === undefined) throw new RangeError('chooseSettings: models must not be empty');
  const { goal, target } = brief.response;
  if (goal === 'more') return (x) => main.expected(x);
  if (goal === 'less') return (x) => -main.expected(x);
  const aim = main.scale.fromUnit(target ?? 0);
  return (x) => {
    const { mean, sd } = beliefOf(main.level(x));
    return -Math.hypot(mean - aim, sd);
  };
}

/** Puts settings back to usual, those that matter least first, as long as that costs nothing worth having. */
function putBack(
  question: ChoiceQuestion,
  best: readonly number[],
  merit: (x: readonly number[]) => number,
  holds: (x: readonly number[]) => boolean,
): number[] {
  const { brief, usual, failures, tolerance } = question;
  const floor = merit(best) - tolerance;
  let x = [...best];
  for (;;) {
    const back = usual.flatMap((value, place) => (value === x[place] ? [] : [x.with(place, value)]));
    const allowed = back.filter(
      (point) =>
        merit(point) >= floor && !isForbidden(brief, point) && !failures.excludes(point) && holds(point),
    );
    const next = bestBy(allowed, merit);
    if (next === undefined) return x;
    x = [...next];
  }
}

function bestBy<Item>(items: readonly Item[], merit: (item: Item) => number): Item | undefined {
  let best: { item: Item; value: number } | undefined;
  for (const item of items) {
    const value = merit(item);
    if (best === undefined || value > best.value) best = { item, value };
  }
  return best?.item;
}
