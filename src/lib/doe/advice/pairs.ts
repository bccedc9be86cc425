import type { Analysis, TermEstimate } from '../analysis/analysis.ts';
import { predict } from '../analysis/predict.ts';
import type { Fact } from '../facts.ts';
import { type CallContext, callOf, intervalInUnit } from './calls.ts';
import { REGULARITIES } from './effect-regularities.ts';

/** The result at the four corners of a pair, the other settings in the middle of their range (choices averaged). */
export function pairCorners(term: string, context: CallContext): Fact {
  const { analysis, scale, result } = context;
  const { letters } = analysis.basis;
  const at = (first: number, second: number) =>
    scale.toUnit(
      predict(
        analysis,
        letters.map((letter) => (letter === term[0] ? first : letter === term[1] ? second : 0)),
      ).fit,
    );
  return {
    kind: 'pair-corners',
    values: { lowLow: at(-1, -1), highLow: at(1, -1), lowHigh: at(-1, 1), highHigh: at(1, 1) },
    refs: { terms: [term], factors: [...term], results: [result] },
  };
}

/** The change of a setting with its partner low and high, in place of one call for both. */
export function dependsOnPartner(letter: string, pair: TermEstimate, context: CallContext): Fact | null {
  const { analysis, scale, result } = context;
  const main = analysis.terms.find((term) => term.term === letter);
  if (main === undefined) return null;
  const inUnit = (value: number) => scale.changeInUnit(value, analysis.intercept.coefficient);
  const low = changeAtPartner(main, pair, -1, analysis);
  const high = changeAtPartner(main, pair, 1, analysis);
  return {
    kind: 'depends-on-partner',
    values: {
      partnerLow: inUnit(low.change),
      partnerLowInterval: intervalInUnit(low.ci, inUnit),
      partnerHigh: inUnit(high.change),
      partnerHighInterval: intervalInUnit(high.ci, inUnit),
      worthHaving: context.worthInUnit,
    },
    refs: {
      terms: [letter, pair.term],
      factors: [letter, pair.term.replace(letter, '')],
      results: [result],
    },
  };
}

function changeAtPartner(
  main: TermEstimate,
  pair: TermEstimate,
  side: 1 | -1,
  analysis: Analysis,
): { change: number; ci: [number, number] | null } {
  const change = main.effect + side * pair.effect;
  if (main.se === null || pair.se === null || main.ci === null || pair.ci === null)
    return { change, ci: null };
  const covariance = covarianceOf(main, pair, analysis);
  const variance = main.se ** 2 + pair.se ** 2 + 2 * side * covariance * main.se * pair.se;
  // Two error estimates may stand behind the two; the wider limit holds for both.
  const limit = Math.max(limitOf(main), limitOf(pair));
  const halfWidth = limit * Math.sqrt(Math.max(0, variance));
  return { change, ci: [change - halfWidth, change + halfWidth] };
}

function limitOf(term: TermEstimate): number {
  return term.ci !== null && term.se !== null && term.se > 0 ? (term.ci[1] - term.effect) / term.se : 0;
}

/** Correlation of two estimates. */
function covarianceOf(first: TermEstimate, second: TermEstimate, { basis, terms }: Analysis): number {
  const place = (term: TermEstimate) =>
    1 + basis.blockColumns + (basis.hasCurvature ? 1 : 0) + terms.indexOf(term);
  const at = (row: number, column: number) => basis.covariance[row]?.[column] ?? 0;
  const [one, two] = [place(first), place(second)];
  const scale = Math.sqrt(at(one, one) * at(two, two));
  return scale > 0 ? at(one, two) / scale : 0;
}

/** How likely a member must be to be named. */
const LIKELY_ENOUGH = 0.6;

/**
 * The likeliest member of a tied sum: active pairs mostly have active parents (Li, Sudarsanam & Frey 2006). A statement of its own, never *clear*; null
 * where none stands out.
 */
export function likeliestMember(term: TermEstimate, context: CallContext): Fact | null {
  const members = [term.term, ...term.aliasedWith.filter((other) => other.length <= 2)];
  if (members.length < 2) return null;
  const isActive = (letter: string) => {
    const main = context.analysis.terms.find((entry) => entry.term === letter);
    return main !== undefined && main !== term && callOf(main, context).sure !== 'not';
  };
  const chances = members.map((member) =>
    member.length === 1
      ? REGULARITIES.mainActive
      : (REGULARITIES.pairActive[[...member].filter(isActive).length] ?? 0) * REGULARITIES.size[2],
  );
  const total = chances.reduce((sum, chance) => sum + chance, 0);
  const best = chances.indexOf(Math.max(...chances));
  const share = (chances[best] ?? 0) / total;
  const named = members[best];
  if (named === undefined || share < LIKELY_ENOUGH) return null;
  return {
    kind: 'likeliest-of-tied',
    values: { share },
    refs: {
      terms: [named, ...members.filter((member) => member !== named)],
      factors: [...named],
      results: [context.result],
    },
  };
}
