import type { Fact } from '../facts.ts';

/** One plan that fits the shop, with its promises. */
export interface Proposal {
  /** Derived from the plan's structure: the same structure has the same id. */
  id: string;
  /** Number of settings. */
  k: number;
  /** Distinct corner combinations. */
  baseRuns: number;
  /** How often each corner is run. */
  replicates: number;
  centerPoints: number;
  /** 1: not split. */
  blocks: number;
  /** Whole plots, middle ones included; absent when everything is shuffled freely. */
  wholePlots?: number;
  runs: number;
  /** Signed: 'D=-ABC'. */
  generators: string[];
  definingWords: string[];
  /** Infinity: full factorial. */
  resolution: number;
  aliases: Alias[];
  confoundedWithBlocks: string[];
  errorPlan: ErrorPlan;
  detectable: Detectable[];
  /** Probability that a main effect of size W is called *likely*; null when the noise or W is unknown or nothing can be judged. */
  powerAtWorthHaving: number | null;
  minutes?: number;
  cost?: number;
  recommended: boolean;
  reasons: Fact[];
  warnings: Fact[];
  /** What the plan is made to test: every main effect and the pairs it can judge. */
  terms: string[];
  /** Only where rules took corners away: variance in a balanced plan of as many runs over the variance here, for each term. */
  efficiencies?: { term: string; relative: number }[];
  /** The runs in standard order, so that a stored proposal can be laid out again whatever becomes of the catalogue. */
  layout: LayoutRow[];
}

/** One run before it has a place in the order. */
export interface LayoutRow {
  /** Coded settings: -1 low, 0 middle, +1 high. */
  x: number[];
  /** From 1. */
  block: number;
  /** From 1. */
  wholePlot?: number;
  center: boolean;
}

/** The estimate of `term` is the sum of it and of each term in `with` times its coefficient (+1 or -1 in regular plans). */
export interface Alias {
  term: string;
  with: { term: string; coefficient: number }[];
}

export type ErrorRung = 'replicates+high-order' | 'replicates' | 'pseudo+replicates' | 'pseudo' | 'none';

/** Where the error of the effects comes from, decided from the layout alone, never from the readings. */
export interface ErrorPlan {
  rung: ErrorRung;
  /** null where the rung has no degrees of freedom in the usual sense (pseudo error, none). */
  df: number | null;
  /** Degrees of freedom of pure error: runs at identical planned settings within a block. */
  replicateDf: number;
  /** One term of order three or up for each free column that goes to error. */
  highOrderTerms: string[];
  /** Single-degree contrasts that are tested, curvature not counted. */
  contrasts: number;
  /** Only with whole plots: the ladder applied to each stratum. */
  strata?: ErrorStratum[];
}

export interface ErrorStratum {
  name: 'whole' | 'sub';
  rung: ErrorRung;
  df: number | null;
  replicateDf: number;
  highOrderTerms: string[];
}

/** The change of the result between low and high of one setting that would be called *likely* 8 times in 10. */
export interface Detectable {
  size: number;
  unit: 'response' | 'noise sd';
  /** `size` over the 80 % interval of the noise. */
  range: [number, number];
  effect: 'easy' | 'hardToChange';
  /** The same for the call *clear*. */
  clearSize: number;
  /** Rung 3 only holds if no more contrasts than this are active; in rungs 1 and 2 all may be. */
  assumedActive: number;
}

export interface PlannedRun {
  /** Place in the run order, from 1. */
  order: number;
  /** Place in the standard order, from 1. */
  standard: number;
  /** From 1. */
  block: number;
  /** From 1. */
  wholePlot?: number;
  /** The same for runs with the same planned settings. */
  group: string;
  center: boolean;
  coded: number[];
  /** Numbers in their unit, choices by name. */
  actual: (number | string)[];
}
