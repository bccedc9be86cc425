import { z } from 'zod';
import '../people/schema-settings.ts';

/** GET /api/activity: newest first; `before` goes on after a page. */
export const listActivitySchema = z.strictObject({
  before: z.coerce.number().int().positive().optional(),
  trial: z.string().max(40).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
export type ListActivity = z.output<typeof listActivitySchema>;

export const activityLineSchema = z.object({
  seq: z.number(),
  at: z.number(),
  kind: z.string(),
  actor: z.object({
    kind: z.enum(['person', 'link', 'service', 'worker', 'command']),
    name: z.string().nullable(),
  }),
  /** Whom or what it is about, by name where that is a person. */
  subject: z.string().nullable(),
  trialId: z.string().nullable(),
  /** Figures, codes and ids, as JSON. */
  details: z.string(),
});
export type ActivityLine = z.output<typeof activityLineSchema>;

export const activityPageSchema = z.object({
  lines: z.array(activityLineSchema),
  next: z.number().nullable(),
});
export type ActivityPage = z.output<typeof activityPageSchema>;
