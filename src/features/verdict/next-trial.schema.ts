import { z } from 'zod';
import '../people/schema-settings.ts';
import { followReasons } from './follow-reason.ts';

/** POST /api/trials/:id/next. The new trial's id is the client's own, so that asking twice makes one trial. */
export const nextTrialSchema = z.strictObject({ id: z.uuidv7(), reason: z.enum(followReasons) });
export type NextTrialWish = z.output<typeof nextTrialSchema>;
