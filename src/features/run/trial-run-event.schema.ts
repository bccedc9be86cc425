import { z } from 'zod';
import '../people/schema-settings.ts';
import { addedRunKinds } from './added-run.ts';
import { cannotDecisions } from './cannot-decision.ts';
import { changeKinds } from './stretch.ts';

const revision = z.number().int().positive();
const words = z.string().trim().min(1).max(500);
const change = z.strictObject({ kind: z.enum(changeKinds), words: z.string().trim().max(200).default('') });

/** What may happen to a trial that is being run. */
export const runTrialEventSchemas = [
  z.strictObject({ event: z.literal('pause'), revision }),
  /** Stopping is never refused for a page that is behind: no revision is asked for. */
  z.strictObject({ event: z.literal('hold') }),
  z.strictObject({
    event: z.literal('resume'),
    revision,
    /** Names the note that keeps the reason. */
    id: z.uuidv7(),
    reason: z.string().trim().max(500).default(''),
    change: change.optional(),
  }),
  z.strictObject({ event: z.literal('judge'), revision }),
  z.strictObject({
    event: z.literal('raise a problem'),
    id: z.uuidv7(),
    runId: z.uuidv7().optional(),
    words,
  }),
  z.strictObject({
    event: z.literal('settle a problem'),
    problemId: z.uuidv7(),
    change: change.optional(),
    /** What becomes of the run whose setting cannot be reached. */
    decision: z.enum(cannotDecisions).optional(),
  }),
  z.strictObject({ event: z.literal('something changed'), ...change.shape }),
  z.strictObject({ event: z.literal('back to usual') }),
  z.strictObject({ event: z.literal('add a run'), id: z.uuidv7(), kind: z.enum(addedRunKinds) }),
] as const;
export type RunTrialEvent = z.output<(typeof runTrialEventSchemas)[number]>;
export type RunTrialEventInput = z.input<(typeof runTrialEventSchemas)[number]>;
