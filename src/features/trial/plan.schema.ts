import { z } from 'zod';
import type { Proposal } from '../../lib/doe/index.ts';
import { settingEnds } from './answer-choices.ts';
import '../people/schema-settings.ts';

export const publicRunSchema = z.object({
  /** Place in the order of running, from 1. */
  order: z.number(),
  center: z.boolean(),
  block: z.number(),
  wholePlot: z.number().optional(),
  /** -1 low, 0 middle, +1 high; A first. */
  coded: z.array(z.number()),
  /** What the dials are set to: numbers in their unit, choices by name. */
  planned: z.array(z.union([z.number(), z.string()])),
});
export type PublicRun = z.output<typeof publicRunSchema>;

/** One of the hardest mixes of a plan: a run to look at before the start. */
export const hardMixSchema = z.object({
  order: z.number(),
  /** The end of each setting by the setting's id, as the question `look` names it. */
  ends: z.record(z.string(), z.enum(settingEnds)),
});
export type HardMix = z.output<typeof hardMixSchema>;

/**
 * A proposal as it is sent; JSON has no word for a resolution without end. The server has checked it with the core's own
 * schema, which would be a heavy load for a page.
 */
export const sentProposalSchema = z
  .custom<Omit<Proposal, 'resolution'> & { resolution: number | null }>(
    (value) => typeof value === 'object' && value !== null && 'layout' in value,
  )
  .transform(
    (stored): Proposal => ({ ...stored, resolution: stored.resolution ?? Number.POSITIVE_INFINITY }),
  );

/** The chosen plan, as it is stored. */
export const publicPlanSchema = z.object({
  /** Counts the plans that were chosen for this trial. */
  n: z.number(),
  proposalId: z.string(),
  proposal: sentProposalSchema,
  /** The id of the setting behind each place of `coded`. */
  settingIds: z.array(z.string()),
  runs: z.array(publicRunSchema),
  hardest: z.array(hardMixSchema),
  hash: z.string(),
  /** False when the answers have changed since, so that a plan must be chosen again. */
  fits: z.boolean(),
});
export type PublicPlan = z.output<typeof publicPlanSchema>;
