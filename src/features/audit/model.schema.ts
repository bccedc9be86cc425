import { z } from 'zod';
import '../people/schema-settings.ts';

const transformSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.enum(['none', 'log', 'sqrt', 'arcsine']) }),
  z.strictObject({ kind: z.literal('boxCox'), lambda: z.number().min(-3).max(3) }),
]);

/** What makes an engineer's model another one than the trial's own. */
export const modelSpecSchema = z.strictObject({
  /** 0 is the main result. */
  result: z.number().int().min(0).max(3),
  terms: z
    .array(z.string().regex(/^[A-G]{1,7}$/))
    .min(1)
    .max(40),
  refuseHierarchy: z.boolean(),
  transform: transformSchema,
  /** Runs by their number, each with why it is left out. */
  without: z
    .array(z.strictObject({ run: z.number().int().positive(), reason: z.string().trim().min(3).max(300) }))
    .max(20),
  stretchesAsBlocks: z.boolean(),
  /** `residual`: what the model leaves is its error; `ladder`: as the trial's own. */
  error: z.enum(['ladder', 'residual']),
});
export type ModelSpec = z.output<typeof modelSpecSchema>;

export const saveModelSchema = z.strictObject({
  name: z.string().trim().min(1).max(80),
  spec: modelSpecSchema,
});
export type SaveModel = z.output<typeof saveModelSchema>;

export const publicModelSchema = z.object({
  id: z.string(),
  name: z.string(),
  spec: modelSpecSchema,
  /** The readings it was first made for; others have another hash. */
  inputHash: z.string(),
  by: z.string(),
  at: z.number(),
});
export type PublicModel = z.output<typeof publicModelSchema>;

export const modelsSchema = z.object({ models: z.array(publicModelSchema) });
export const trialModelsParamsSchema = z.object({ id: z.string() });
export const modelParamsSchema = z.object({ id: z.string(), model: z.string() });
/** The id is the client's own: sent twice, it makes one model. */
export const newModelParamsSchema = z.object({ id: z.string(), model: z.uuidv7() });
