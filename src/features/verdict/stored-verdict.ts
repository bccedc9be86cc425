import { z } from 'zod';
import { bestBetSchema, confirmationVerdictSchema, verdictSchema } from '../../lib/doe/index.ts';

/** A run as it stood when the verdict was made: what its facts speak about. */
export const judgedRunSchema = z.object({
  number: z.number(),
  order: z.number(),
  planned: z.array(z.union([z.number(), z.string()])),
  coded: z.array(z.number()),
  /** Figures that counted, result by result: parts of a measured result, or the count of a lot. */
  readings: z.array(z.array(z.number())),
  end: z.string(),
});
export type JudgedRun = z.output<typeof judgedRunSchema>;

/** What a verdict says. It is stored when made and shown from there. */
export const verdictFactsSchema = z.object({
  v: z.literal(1),
  verdict: verdictSchema,
  bet: bestBetSchema,
  confirmation: confirmationVerdictSchema.nullable(),
  runs: z.array(judgedRunSchema),
});
export type VerdictFacts = z.output<typeof verdictFactsSchema>;

export interface StoredVerdict {
  id: string;
  n: number;
  inputHash: string;
  coreVersion: string;
  facts: VerdictFacts;
  madeAt: number;
}
