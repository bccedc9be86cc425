import { analyzeSteadiness } from '../analysis/steadiness.ts';
import type { Brief } from '../brief.ts';
import type { PlannedRun } from '../design/proposal.ts';
import type { Fact } from '../facts.ts';
import { type CallContext, callContextOf, callFact, callOf, decideCall, uncalledFact } from './calls.ts';
import { findFailures, joinFailures } from './failures.ts';
import { chooseHeadline } from './headline.ts';
import { listNextSteps } from './next-steps.ts';
import { dependsOnPartner, likeliestMember, pairCorners } from './pairs.ts';
import { modelResult, type ResultInput } from './result-model.ts';
import { tryWithModels } from './settings-to-try.ts';
import { listTrust, missingRuns } from './trust.ts';
import type { Verdict } from './verdict.ts';
import { listWatched } from './watched.ts';
import { runsToSettle } from './would-settle.ts';

/**
 * What the trial says, as facts without words: a call for each setting and pair of the main result, what speaks for and against them, what watched results
 * do, what cannot be told and what comes next.
 *
 * Failed runs are the strongest readings of all and have no figure, so there are no calls by least squares of a result with failures. Settings keep away
 * from the failures of every result.
 *
 * @param plan the runs as they were planned, in run order
 * @param results main result first
 * @throws RangeError when there is no result
 */
export function judge(brief: Brief, plan: readonly PlannedRun[], results: readonly ResultInput[]): Verdict {
  const [main] = results;
  if (main === undefined) throw new RangeError('judge: results must not be empty');
  const models = results.map((result) => modelResult(brief, result));
  const [model] = models;
  if (model === undefined) throw new RangeError('judge: results must not be empty');
  const failuresOf = results.map(({ input }) => findFailures(input.runs));
  const failures = failuresOf[0] ?? joinFailures([]);
  const missing = missingRuns(main, failures);
  const context = callContextOf(main, model);
  const bet = tryWithModels(brief, results, models, context);
  const judged = failures.runs.length === 0;
  const settings = judged ? callSettings(brief, context) : [];
  const pairs = judged ? callPairs(context) : [];
  const details = judged ? listDetails(context) : [];
  const trust = listTrust({ brief, plan, result: main, results, model, context, failures: failuresOf });
  const calls = [...settings, ...pairs];
  return {
    headline: chooseHeadline({
      bet,
      calls,
      details,
      failures,
      missing,
      planned: Math.max(plan.length, main.input.runs.length),
    }),
    settings,
    pairs,
    details,
    trust,
    watched: listWatched(results, models, failuresOf),
    steadier: judged ? judgeSteadiness(main) : [],
    cannotTell: listLimits(context, main),
    next: listNextSteps({ brief, bet, failures: joinFailures(failuresOf), missing, calls, details, trust }),
  };
}

/** One call for each setting; where a pair with it matters, its change on either side of the partner takes the place of "no difference". */
function callSettings(brief: Brief, context: CallContext): Fact[] {
  const { analysis } = context;
  const mattering = analysis.terms.filter(
    (term) => term.term.length === 2 && callOf(term, context).call === 'matters',
  );
  return brief.factors.map((_, place) => {
    const letter = String.fromCharCode(65 + place);
    const term = analysis.terms.find((entry) => entry.term === letter);
    if (term === undefined) return uncalledFact(letter, context);
    const pair = mattering.find(
      (entry) =>
        entry.term.includes(letter) ||
        entry.aliasedWith.some((other) => other.length === 2 && other.includes(letter)),
    );
    if (pair?.term.includes(letter) && callOf(term, context).call !== 'matters')
      return dependsOnPartner(letter, pair, context) ?? callFact(term, context);
    const fact = callFact(term, context);
    // A pair that matters and may be this setting's own, by a tie, forbids "no difference" as well.
    if (pair !== undefined && fact.kind === 'no-real-difference')
      return {
        kind: 'cant-tell',
        values: {
          change: fact.values.change,
          interval: fact.values.interval,
          sure: fact.values.sure,
          worthHaving: fact.values.worthHaving,
          because: 'too-wide',
        },
        refs: fact.refs,
      };
    return fact;
  });
}

function callPairs(context: CallContext): Fact[] {
  return context.analysis.terms
    .filter((term) => term.term.length === 2)
    .map((term) => callFact(term, context));
}

function listDetails(context: CallContext): Fact[] {
  return context.analysis.terms.flatMap((term): Fact[] => {
    const { call } = callOf(term, context);
    if (call === 'cant-tell') {
      const runs = runsToSettle(term, context);
      return runs === null
        ? []
        : [
            {
              kind: 'would-settle',
              values: { runs },
              refs: { terms: [term.term], results: [context.result] },
            },
          ];
    }
    if (call === 'no-real-difference') return [];
    const named = likeliestMember(term, context);
    const corners = call === 'matters' && term.term.length === 2 ? [pairCorners(term.term, context)] : [];
    return [...corners, ...(named === null ? [] : [named])];
  });
}

/** From five parts a run on: which settings change the spread between parts. */
function judgeSteadiness({ input, spec }: ResultInput): Fact[] {
  const analysis = spec.kind === 'measured' ? analyzeSteadiness(input, spec.resolution ?? 0) : null;
  if (analysis === null) return [];
  const worthHaving = spec.steadierWorthHaving ?? 1.5;
  return analysis.terms.flatMap((term): Fact[] => {
    const { call, sure } = decideCall({
      ci: term.ci,
      pFamily: term.pFamily,
      worthHaving: Math.log(worthHaving),
      alpha: analysis.basis.alpha,
    });
    if (call !== 'matters') return [];
    const interval: [number, number] | null = term.ci && [Math.exp(term.ci[0]), Math.exp(term.ci[1])];
    return [
      {
        kind: 'steadier-matters',
        values: { ratio: Math.exp(term.effect), interval, sure, worthHaving },
        refs: { terms: [term.term], factors: [...term.term], results: [0] },
      },
    ];
  });
}

function listLimits({ analysis }: CallContext, { input }: ResultInput): Fact[] {
  const facts: Fact[] = [];
  if (input.factors.some((factor) => factor.kind === 'number'))
    facts.push({ kind: 'nothing-outside-range', values: {}, refs: {} });
  for (const alias of analysis.aliases) {
    const terms = [alias.term, ...alias.with.map(({ term }) => term).filter((term) => term.length <= 2)];
    if (terms.length > 1) facts.push({ kind: 'cannot-be-told-apart', values: {}, refs: { terms } });
  }
  const hidden = analysis.confoundedWithBlocks.filter((term) => term.length <= 2);
  if (hidden.length > 0) facts.push({ kind: 'hidden-by-batches', values: {}, refs: { terms: hidden } });
  if (analysis.within !== undefined)
    facts.push({ kind: 'short-term-spread', values: { parts: analysis.within.parts }, refs: {} });
  return facts;
}
