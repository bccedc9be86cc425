import { z } from 'zod';
import '../people/schema-settings.ts';

/** POST /api/trials/:id/check-back: whether settings that are in use hold. */
export const checkBackSchema = z.strictObject({
  holds: z.boolean(),
  note: z.string().trim().max(1_000).default(''),
});
export type CheckBack = z.output<typeof checkBackSchema>;
