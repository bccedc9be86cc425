import type { Fact } from '../facts.ts';
import { decideCall, intervalInUnit } from './calls.ts';
import type { Failures } from './failures.ts';
import type { ResultInput, ResultModel } from './result-model.ts';

/** Settings and pairs that move a watched result, each result a family of its own; nothing is said of one with failed runs. */
export function listWatched(
  results: readonly ResultInput[],
  models: readonly ResultModel[],
  failures: readonly Failures[],
): Fact[] {
  return results.slice(1).flatMap(({ spec, analysis }, place) => {
    const scale = models[place + 1]?.scale;
    if (scale === undefined || (failures[place + 1]?.runs.length ?? 0) > 0) return [];
    const center = analysis.intercept.coefficient;
    const inUnit = (value: number) => scale.changeInUnit(value, center);
    return analysis.terms.flatMap((term): Fact[] => {
      const { sure } = decideCall({
        ci: term.ci,
        pFamily: term.pFamily,
        worthHaving: scale.worthHaving(spec, center) ?? 0,
        alpha: analysis.basis.alpha,
      });
      if (sure === 'not') return [];
      return [
        {
          kind: 'watched-moves',
          values: { change: inUnit(term.effect), interval: intervalInUnit(term.ci, inUnit), sure },
          refs: { terms: [term.term], factors: [...term.term], results: [place + 1] },
        },
      ];
    });
  });
}
