import { z } from 'zod';
import '../people/schema-settings.ts';
import { runTrialEventSchemas } from '../run/trial-run-event.schema.ts';
import { verdictEventSchemas } from '../verdict/decision.schema.ts';
import { trialStates } from './trial-states.ts';

export const trialParamsSchema = z.object({ id: z.string() });
/** PUT makes one, so its id must be well formed. */
export const newTrialParamsSchema = z.object({ id: z.uuidv7() });
const revision = z.number().int().positive();

/** A row of the trials list. Moments are milliseconds UTC. */
export const publicTrialSchema = z.object({
  id: z.string(),
  /** Counts up within the shop. */
  number: z.number(),
  /** Empty until the job has a name. */
  title: z.string(),
  machine: z.string(),
  ownerName: z.string(),
  phase: z.enum(['main', 'check']),
  state: z.enum(trialStates),
  revision: z.number(),
  putAwayAt: z.number().nullable(),
  createdAt: z.number(),
  updatedAt: z.number(),
});
export type PublicTrial = z.output<typeof publicTrialSchema>;

/** PUT /api/trials/:id. The id is the client's, so that sending it twice makes one trial. */
export const createTrialSchema = z.strictObject({
  /** An earlier trial whose answers this one starts from. */
  copyOf: z.uuidv7().optional(),
});
export type CreateTrial = z.output<typeof createTrialSchema>;

export const trialSorts = ['changed', 'number', 'title', 'machine'] as const;
export const stateFilters = ['all', 'planning', 'running', 'deciding', 'closed'] as const;

/** The states that a filter of the list shows. */
export const statesOfFilter = {
  all: trialStates,
  planning: ['draft', 'plan review', 'ready'],
  running: ['running', 'paused', 'held', 'readings in'],
  deciding: ['verdict review', 'deciding', 'adoption review'],
  closed: ['closed'],
} as const satisfies Record<(typeof stateFilters)[number], readonly (typeof trialStates)[number][]>;

/** GET /api/trials. A page's `next` continues exactly where it ended. */
export const listTrialsSchema = z.strictObject({
  search: z.string().trim().max(80).default(''),
  state: z.enum(stateFilters).default('all'),
  /** `away`: those that were put away. */
  show: z.enum(['here', 'away']).default('here'),
  sort: z.enum(trialSorts).default('changed'),
  direction: z.enum(['ascending', 'descending']).default('descending'),
  after: z.string().max(800).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(25),
});
export type ListTrials = z.output<typeof listTrialsSchema>;

export const trialsPageSchema = z.object({
  trials: z.array(publicTrialSchema),
  next: z.string().nullable(),
});
export type TrialsPage = z.output<typeof trialsPageSchema>;

/** PATCH /api/trials/:id: puts it away or takes it out again. */
export const changeTrialSchema = z.strictObject({ revision, putAway: z.boolean() });
export type ChangeTrial = z.output<typeof changeTrialSchema>;

/** DELETE /api/trials/:id carries the state that the reader saw in its address. */
export const deleteTrialQuerySchema = z.strictObject({ revision: z.coerce.number().int().positive() });

/** POST /api/trials/:id/plan. Only the choice travels: the server works the plan out anew. */
export const choosePlanSchema = z.strictObject({ revision, proposalId: z.string().min(1).max(400) });
export type ChoosePlan = z.output<typeof choosePlanSchema>;

/** POST /api/trials/:id/events. Events of a running trial join this union where they are carried out. */
export const trialEventSchema = z.discriminatedUnion('event', [
  z.strictObject({ event: z.literal('send for review'), revision }),
  z.strictObject({ event: z.literal('start'), revision }),
  ...verdictEventSchemas,
  ...runTrialEventSchemas,
]);
export type TrialEventBody = z.output<typeof trialEventSchema>;
