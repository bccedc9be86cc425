import { defineFact } from '../define-fact.ts';
import { z } from '../zod.ts';

const share = z.number().min(0).max(1);

/** Why a plan is proposed. */
const reasons = [
  /** The cheapest plan that would call a change of W at least *likely* 8 times in 10. */
  defineFact('cheapest-with-power', { power: share, runs: z.number() }),
  /** None reaches 8 in 10 within the limits; this one comes nearest. */
  defineFact('most-power-within-limits', { power: share, runs: z.number() }),
  /** Noise or W unknown: the cheapest plan that measures its own noise. */
  defineFact('cheapest-with-own-error', { runs: z.number() }),
  /** A first look at many settings, to be followed by runs that untie what it ties. */
  defineFact('screen-first', { resolution: z.number() }),
  /** Nothing better fits the limits. */
  defineFact('fits-the-limits', { runs: z.number() }),
  /** Fewer runs than the recommended plan. */
  defineFact('quicker', { fewerRuns: z.number() }),
  /** Sees smaller changes than the recommended plan. */
  defineFact('surer', { size: z.number(), recommendedSize: z.number() }),
  /** No main effect is tied to another or to a pair. */
  defineFact('main-effects-apart', {}),
  /** Every pair is estimated by itself. */
  defineFact('pairs-apart', {}),
  /** Middle runs show whether the middle is off the straight line. */
  defineFact('shows-a-bend', { middles: z.number() }),
  /** Everything is shuffled freely, so that hard settings are judged like all others. */
  defineFact('judges-hard-settings', {}),
  /** With five parts a run or more: the ratio of spreads, low to high, that would be seen 8 times in 10. */
  defineFact('judges-spread', { parts: z.number(), ratio: z.number() }),
] as const;

/** What a plan cannot do, and what its promises rest on. */
const warnings = [
  /** Each main effect in `refs.terms` is tied to a pair. */
  defineFact('main-effects-tied-to-pairs', { resolution: z.number() }),
  /** One fact for each group of pairs that share a contrast. */
  defineFact('pairs-tied', {}),
  /** Terms that cannot be told from differences between blocks. */
  defineFact('hidden-by-blocks', { blocks: z.number() }),
  /** A block holds fewer runs than the plan needs; `needed` is the smallest size that would do. */
  defineFact('block-too-small', { runsEach: z.number(), needed: z.number() }),
  /** Too few whole plots, or none left for error: these settings get no interval. */
  defineFact('hard-setting-not-judged', { wholePlots: z.number() }),
  /** Hard settings are set afresh in every run. */
  defineFact('hard-settings-shuffled', {}),
  /** Too few repeats: error is judged from the small effects, which holds if at most so many effects are active. */
  defineFact('error-from-small-effects', { assumedActive: z.number() }),
  /** No error at all: estimates and a best bet, but every call is open. */
  defineFact('no-error-estimate', {}),
  /** Set-up spread nobody gave, assumed as half the spread of parts. */
  defineFact('setup-assumed', { setup: z.number() }),
  /** Sizes are in run-to-run standard deviations. */
  defineFact('noise-unknown', {}),
  /** Promises for counts rest on pure counting noise; real noise is often more. */
  defineFact('counting-noise-only', {}),
  /** Fewer than five rejects or flaws to be expected in a usual run; `lotNeeded` parts would give five; null: no lot would, as there are none today. */
  defineFact('few-rejects', { expected: z.number(), lotSize: z.number(), lotNeeded: z.number().nullable() }),
  /** Parts made in a row show short-term spread only. */
  defineFact('short-term-spread-only', { parts: z.number() }),
  /** Two or more choices: the bend is seen at their usual combination alone. */
  defineFact('bend-at-usual-choices', {}),
  /** No middle runs: a bend would go unseen. */
  defineFact('bend-not-shown', {}),
  /** A rule empties a corner of this pair, so no plan can show how the two work together. */
  defineFact('pair-emptied-by-rule', { rule: z.number() }),
  /** Moving the end of one range to here would make the rule needless and the plan balanced. */
  defineFact('narrow-a-range-first', { rule: z.number(), low: z.number(), high: z.number() }),
  /** A main effect known worse than in a balanced plan of as many runs. */
  defineFact('uneven-corners', { lowestEfficiency: share }),
  /** The middle lies on the edge of what a rule forbids: look at it before it is run. */
  defineFact('middle-touches-rule', { rule: z.number() }),
  /** Noise so small that changing one setting at a time would do as well as this screening. */
  defineFact('one-at-a-time-would-do', { noise: z.number(), worthHaving: z.number() }),
] as const;

/** What can be said about a plan before any run. */
export const designFacts = [...reasons, ...warnings] as const;
