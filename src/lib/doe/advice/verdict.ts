import { factSchema } from '../facts.ts';
import { z } from '../zod.ts';
import { beliefMixtureSchema } from './belief.ts';

const interval = z.tuple([z.number(), z.number()]);

/** A result at the settings to try. */
const outlookSchema = z.object({
  /** Place of the result: 0 is the main one. */
  result: z.number(),
  predicted: z.number(),
  interval,
  /** Change against usual settings. */
  versusUsual: z.number(),
  gainInterval: interval,
  /** Probability that its limits hold; null: it has none. */
  limitProbability: z.number().nullable(),
  /** Where its limits bind single parts: the interval of one part. */
  partInterval: interval.nullable(),
});

export const bestBetSchema = z.object({
  /** The settings to try, in coded units and on the dials. */
  coded: z.array(z.number()),
  actual: z.array(z.union([z.number(), z.string()])),
  /** The main result there, with its 95 % interval, in the result's unit (rejects: share; flaws: per lot). */
  predicted: z.number(),
  interval,
  /** Change of the main result against usual settings, as it stands; less is better where the goal is less. */
  versusUsual: z.number(),
  gainInterval: interval,
  /** Probability that the change is for the better, and that it is at least W. */
  chanceBetter: z.number(),
  chanceWorthHaving: z.number().nullable(),
  /** Whether this very combination was run and read. */
  tested: z.boolean(),
  /** Whether today's settings are the advice; `coded` then still holds the best that was found. */
  keepToday: z.boolean(),
  /** The main result's own outlook, then one for each watched result. */
  main: outlookSchema,
  watched: z.array(outlookSchema),
  /** Probability that all limits hold together; null: there are none. */
  allLimits: z.number().nullable(),
  reasons: z.array(factSchema),
  /** What the check runs will be judged by: belief about the gain (better is positive) and the trial's own error, on the readings' scale. */
  basis: z.object({
    gain: beliefMixtureSchema,
    error: z.object({ df: z.number(), ss: z.number() }).nullable(),
    worthHaving: z.number().nullable(),
    /** 1: more is better; -1: less is better (for a target: the way towards it). */
    direction: z.union([z.literal(1), z.literal(-1)]),
  }),
});

export type BestBet = z.infer<typeof bestBetSchema>;
export type Outlook = z.infer<typeof outlookSchema>;

export const verdictSchema = z.object({
  headline: factSchema,
  /** One for each setting, in their order: its call. */
  settings: z.array(factSchema),
  /** The calls of the estimated pairs. */
  pairs: z.array(factSchema),
  /** Corner values, attributions and what would settle open calls. */
  details: z.array(factSchema),
  trust: z.array(factSchema),
  watched: z.array(factSchema),
  steadier: z.array(factSchema),
  cannotTell: z.array(factSchema),
  next: z.array(factSchema),
});

export type Verdict = z.infer<typeof verdictSchema>;

export const confirmationVerdictSchema = z.object({
  outcome: z.enum(['held', 'fellShort', 'notSureYet']),
  /** Mean at the new settings minus mean at usual, better is positive. */
  gain: z.number(),
  interval: interval.nullable(),
  predicted: interval,
  /** Further pairs of runs that would settle it; 0 where nothing is open. */
  furtherPairs: z.number(),
  facts: z.array(factSchema),
});

export type ConfirmationVerdict = z.infer<typeof confirmationVerdictSchema>;
