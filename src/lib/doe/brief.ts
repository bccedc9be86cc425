import { z } from './zod.ts';

/** The answers as plain data: everything a plan, and later a verdict, depends on. Its shape is checked here; its sense in `design/check-brief.ts`. */
export interface Brief {
  /** The main result. */
  response: ResponseSpec;
  /** Up to three results to keep an eye on. */
  watch: ResponseSpec[];
  /** One to seven; the first is A, the second B, and so on. */
  factors: FactorSpec[];
  /** Each rule forbids every point at which all the settings it names are beyond their middle towards the given level. */
  forbidden: ForbiddenRule[];
  blocks?: BlockSpec;
  budget: Budget;
  /** For planning and as the prior of the best bet only, never for intervals; null: nobody knows. */
  noise: NoiseGuess | null;
}

/** 'A', 'B', …; a term is its letters in order: 'A', 'AB', 'ABC'; 'AA' is a quadratic term. */
export type Letter = string;

export type ForbiddenRule = { [letter: Letter]: -1 | 1 };

export interface ResponseSpec {
  name: string;
  unit: string;
  kind: 'measured' | 'rejects' | 'flaws';
  /** Parts inspected in one run, for rejects and flaws. */
  lotSize?: number;
  /** Parts measured in one run; 1 if not given. */
  partsPerRun?: number;
  /** Smallest step of the gauge, in the result's unit. */
  resolution?: number;
  goal: 'more' | 'less' | 'target';
  target?: number;
  lower?: number;
  upper?: number;
  /** Whether `lower` and `upper` bind the mean of a run or one single part. */
  limitFor?: 'mean' | 'part';
  /** Probability with which the limits must be met; .9 if not given. */
  limitProbability?: number;
  /** Today's figure: rejects as a share of the lot, flaws per lot, a measured result in its unit. */
  usualRate?: number;
  /** W, the smallest change between low and high that the crew would care about; required on the main result. Rejects: a share. Flaws: a count per lot. */
  worthHaving?: number;
  /** Ratio of standard deviations that would be worth having; 1.5 if not given. */
  steadierWorthHaving?: number;
}

interface FactorManners {
  name: string;
  panelName?: string;
  hardToChange?: boolean;
  /** Minutes to wait after this setting changes. */
  settleMinutes?: number;
  /** Parts to throw away after this setting changes. */
  discardParts?: number;
  /** The end that is harder on people or machine. */
  harderEnd?: 'low' | 'high';
}

export interface NumberFactor extends FactorManners {
  kind: 'number';
  unit: string;
  low: number;
  high: number;
  usual: number;
  /** Smallest step of the dial. */
  step?: number;
  /** The machine's own limits. */
  min?: number;
  max?: number;
}

export interface ChoiceFactor extends FactorManners {
  kind: 'choice';
  low: string;
  high: string;
  usual: 'low' | 'high';
}

export type FactorSpec = NumberFactor | ChoiceFactor;

export interface BlockSpec {
  name: string;
  kind: 'batch' | 'shift' | 'machine';
  /** How many there are. */
  count: number;
  /** Runs that fit into one. */
  runsEach?: number;
}

export interface Budget {
  maxRuns: number;
  minutes?: number;
  money?: number;
  minutesPerRun?: number;
  costPerRun?: number;
}

export interface NoiseGuess {
  /** Standard deviation, in the main result's unit. */
  sd: number;
  /** Of single parts (run-to-run set-up spread comes on top) or of the mean of a whole run. */
  of: 'part' | 'runMean';
  /** Degrees of freedom behind `sd`; 4 if not given, as for a guess from the lowest and the highest. */
  df?: number;
  /** Standard deviation that setting the dials afresh adds; half of `sd` if not given. */
  setup?: number;
}

const optionalNumber = z.number().exactOptional();

const forbiddenRuleSchema = z.record(z.string(), z.union([z.literal(-1), z.literal(1)]));

export const responseSchema = z.object({
  name: z.string(),
  unit: z.string(),
  kind: z.enum(['measured', 'rejects', 'flaws']),
  lotSize: optionalNumber,
  partsPerRun: optionalNumber,
  resolution: optionalNumber,
  goal: z.enum(['more', 'less', 'target']),
  target: optionalNumber,
  lower: optionalNumber,
  upper: optionalNumber,
  limitFor: z.enum(['mean', 'part']).exactOptional(),
  limitProbability: optionalNumber,
  usualRate: optionalNumber,
  worthHaving: optionalNumber,
  steadierWorthHaving: optionalNumber,
}) satisfies z.ZodType<ResponseSpec>;

const manners = {
  name: z.string(),
  panelName: z.string().exactOptional(),
  hardToChange: z.boolean().exactOptional(),
  settleMinutes: optionalNumber,
  discardParts: optionalNumber,
  harderEnd: z.enum(['low', 'high']).exactOptional(),
};

export const factorSchema = z.discriminatedUnion('kind', [
  z.object({
    ...manners,
    kind: z.literal('number'),
    unit: z.string(),
    low: z.number(),
    high: z.number(),
    usual: z.number(),
    step: optionalNumber,
    min: optionalNumber,
    max: optionalNumber,
  }),
  z.object({
    ...manners,
    kind: z.literal('choice'),
    low: z.string(),
    high: z.string(),
    usual: z.enum(['low', 'high']),
  }),
]) satisfies z.ZodType<FactorSpec>;

/** Shape only; what makes no sense (low above high, a name twice) is refused by `proposePlans` with a `PlanError` that names the field. */
export const briefSchema = z.object({
  response: responseSchema,
  watch: z.array(responseSchema).max(3),
  factors: z.array(factorSchema).min(1).max(7),
  forbidden: z.array(forbiddenRuleSchema),
  blocks: z
    .object({
      name: z.string(),
      kind: z.enum(['batch', 'shift', 'machine']),
      count: z.number(),
      runsEach: optionalNumber,
    })
    .exactOptional(),
  budget: z.object({
    maxRuns: z.number(),
    minutes: optionalNumber,
    money: optionalNumber,
    minutesPerRun: optionalNumber,
    costPerRun: optionalNumber,
  }),
  noise: z
    .object({ sd: z.number(), of: z.enum(['part', 'runMean']), df: optionalNumber, setup: optionalNumber })
    .nullable(),
}) satisfies z.ZodType<Brief>;
