import { z } from 'zod';
import '../people/schema-settings.ts';

const revision = z.number().int().positive();
const note = z.string().trim().max(1_000);

/** Takes the new settings over; `unchecked`: before check runs held, and then only with a reason. */
export const adoptSchema = z.strictObject({
  event: z.literal('adopt'),
  revision,
  unchecked: z.boolean(),
  note: note.default(''),
});
export type Adopt = z.output<typeof adoptSchema>;

/** Leaves the machine as it is; `keepToday`: for good, else for now. */
export const notNowSchema = z.strictObject({
  event: z.literal('not now'),
  revision,
  keepToday: z.boolean(),
  note: note.default(''),
});
export type NotNow = z.output<typeof notNowSchema>;

export const planCheckRunsSchema = z.strictObject({
  event: z.literal('plan check runs'),
  revision,
  /** How many of each; as many as the verdict asks for unless told. */
  pairs: z.number().int().min(1).max(12).optional(),
});
export type PlanCheckRuns = z.output<typeof planCheckRunsSchema>;

export const openAgainSchema = z.strictObject({
  event: z.literal('open again'),
  revision,
  reason: z.string().trim().min(3).max(500),
});
export type OpenAgain = z.output<typeof openAgainSchema>;

/** What may follow a verdict; these join the events of a trial. */
export const verdictEventSchemas = [adoptSchema, notNowSchema, planCheckRunsSchema, openAgainSchema] as const;
