import { z } from 'zod';
import '../../people/schema-settings.ts';
import { verdictFactsSchema } from '../../verdict/stored-verdict.ts';

/** GET /api/trials/:id/verdict: the latest verdict as it was stored; null before there is one. */
export const verdictAnswerSchema = z.object({
  trialId: z.string(),
  verdict: z
    .object({
      n: z.number(),
      inputHash: z.string(),
      coreVersion: z.string(),
      madeAt: z.number(),
      facts: verdictFactsSchema,
    })
    .nullable(),
});

/** GET /api/trials/:id/audit: for each result what went into its analysis and all that came out. */
export const auditAnswerSchema = z.object({
  trialId: z.string(),
  n: z.number().nullable(),
  results: z.array(
    z.object({ spec: z.looseObject({}), input: z.looseObject({}), analysis: z.looseObject({}) }),
  ),
});
