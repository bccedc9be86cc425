import { factSchema } from '../facts.ts';
import { z } from '../zod.ts';
import type { Alias, Detectable, ErrorPlan, LayoutRow, Proposal } from './proposal.ts';

const whole = z.number().int();

/** JSON has no Infinity and writes null for it; nothing else of a proposal's resolution could be null. */
const resolutionSchema = z
  .union([z.number(), z.literal(Number.POSITIVE_INFINITY), z.null()])
  .transform((resolution) => resolution ?? Number.POSITIVE_INFINITY);

const aliasSchema = z.object({
  term: z.string(),
  with: z.array(z.object({ term: z.string(), coefficient: z.number() })),
}) satisfies z.ZodType<Alias>;

const rungSchema = z.enum(['replicates+high-order', 'replicates', 'pseudo+replicates', 'pseudo', 'none']);

const errorSource = {
  rung: rungSchema,
  df: z.number().nullable(),
  replicateDf: z.number(),
  highOrderTerms: z.array(z.string()),
};

/** An error plan as it is stored with a trial before the first run. */
export const errorPlanSchema = z.object({
  ...errorSource,
  contrasts: z.number(),
  strata: z.array(z.object({ ...errorSource, name: z.enum(['whole', 'sub']) })).exactOptional(),
}) satisfies z.ZodType<ErrorPlan>;

const detectableSchema = z.object({
  size: z.number(),
  unit: z.enum(['response', 'noise sd']),
  range: z.tuple([z.number(), z.number()]),
  effect: z.enum(['easy', 'hardToChange']),
  clearSize: z.number(),
  assumedActive: z.number(),
}) satisfies z.ZodType<Detectable>;

const layoutRowSchema = z.object({
  x: z.array(z.number()),
  block: whole,
  wholePlot: whole.exactOptional(),
  center: z.boolean(),
}) satisfies z.ZodType<LayoutRow>;

/** A stored proposal comes back as it was proposed, a full factorial's resolution included, and is laid out as it was. */
export const proposalSchema = z.object({
  id: z.string(),
  k: whole,
  baseRuns: whole,
  replicates: whole,
  centerPoints: whole,
  blocks: whole,
  wholePlots: whole.exactOptional(),
  runs: whole,
  generators: z.array(z.string()),
  definingWords: z.array(z.string()),
  resolution: resolutionSchema,
  aliases: z.array(aliasSchema),
  confoundedWithBlocks: z.array(z.string()),
  errorPlan: errorPlanSchema,
  detectable: z.array(detectableSchema),
  powerAtWorthHaving: z.number().nullable(),
  minutes: z.number().exactOptional(),
  cost: z.number().exactOptional(),
  recommended: z.boolean(),
  reasons: z.array(factSchema),
  warnings: z.array(factSchema),
  terms: z.array(z.string()),
  efficiencies: z.array(z.object({ term: z.string(), relative: z.number() })).exactOptional(),
  layout: z.array(layoutRowSchema),
}) satisfies z.ZodType<Proposal>;
