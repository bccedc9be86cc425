import { z } from 'zod';
import { trialParamsSchema } from '../trial/trial.schema.ts';

export const shareParamsSchema = trialParamsSchema.extend({ handle: z.string().min(1).max(64) });

/** A link that somebody may read the verdict by. Its address is told once, when it is made. */
export const publicShareSchema = z.object({ id: z.string(), madeAt: z.number(), endsAt: z.number() });
export type PublicShare = z.output<typeof publicShareSchema>;

export const madeShareSchema = publicShareSchema.extend({ address: z.string() });
export type MadeShare = z.output<typeof madeShareSchema>;
