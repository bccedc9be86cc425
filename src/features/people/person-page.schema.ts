import { z } from 'zod';
import { publicPersonSchema } from './public-person.ts';
import './schema-settings.ts';

/** What the log can say of a person's consent; each has its words in `people:consentEvent`. */
export const consentEvents = ['asked', 'given', 'declined', 'withdrawn', 'reset'] as const;
export type ConsentEvent = (typeof consentEvents)[number];

export const consentStepSchema = z.object({
  event: z.enum(consentEvents),
  at: z.number(),
  /** Who asked, by name; null where it was the person, the service or the product itself. */
  by: z.string().nullable(),
  wording: z.number().nullable(),
});
export type ConsentStep = z.output<typeof consentStepSchema>;

/** GET /api/people/:id. */
export const personPageSchema = z.object({
  person: publicPersonSchema,
  consentHistory: z.array(consentStepSchema),
});
export type PersonPage = z.output<typeof personPageSchema>;
