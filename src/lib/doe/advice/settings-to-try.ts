import { lettersOf } from '../analysis/terms.ts';
import type { Brief } from '../brief.ts';
import { betWithModels } from './best-bet.ts';
import { type CallContext, callContextOf, callOf } from './calls.ts';
import { modelResult, type ResultInput, type ResultModel } from './result-model.ts';
import type { BestBet } from './verdict.ts';

/**
 * The settings to try: the best bet, but a setting whose change the crew would not notice stays as it is.
 *
 * @param results main result first
 * @throws RangeError when there is no result
 */
export function settingsToTry(brief: Brief, results: readonly ResultInput[]): BestBet {
  const models = results.map((result) => modelResult(brief, result));
  const [[main], [model]] = [results, models];
  if (main === undefined || model === undefined)
    throw new RangeError('settingsToTry: results must not be empty');
  return tryWithModels(brief, results, models, callContextOf(main, model));
}

/** The same with models and calls that are already there. */
export function tryWithModels(
  brief: Brief,
  results: readonly ResultInput[],
  models: readonly ResultModel[],
  context: CallContext,
): BestBet {
  return betWithModels(brief, results, models, placesNotWorthMoving(brief, context));
}

/** Settings that move the result less than is worth having, alone and in every pair; what cannot be told yet may be worth it. */
function placesNotWorthMoving(brief: Brief, context: CallContext): number[] {
  const open = new Set(
    context.analysis.terms
      .filter((term) => !['no-real-difference', 'real-but-small'].includes(callOf(term, context).call))
      .flatMap((term) => [term.term, ...term.aliasedWith])
      .filter((term) => term.length <= 2)
      .flatMap(lettersOf),
  );
  return brief.factors.flatMap((_, place) => (open.has(String.fromCharCode(65 + place)) ? [] : [place]));
}
