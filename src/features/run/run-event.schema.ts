import { z } from 'zod';
import '../people/schema-settings.ts';
import { runEnds, runStates } from './run.ts';

export const runParamsSchema = z.object({ id: z.string() });

const revision = z.number().int().positive();
/** Names this very sending, so that a second one does nothing. */
const submission = z.uuidv7();
const count = z.number().int().min(0).max(1_000_000);

export const figureSchema = z.strictObject({
  /** 0 is the main result. */
  result: z.number().int().min(0).max(3),
  /** From 1. */
  part: z.number().int().min(1).max(200),
  value: z.number().min(-1e12).max(1e12).nullable().default(null),
  rejects: count.nullable().default(null),
  lot: count.nullable().default(null),
});
export type FigureInput = z.input<typeof figureSchema>;

const figures = z.array(figureSchema).max(800).default([]);
const end = z.enum(['measured', 'failed', 'beyondGauge']).default('measured');
const seen = { revision, submission };

/** POST /api/runs/:id/events. */
export const runEventSchema = z.discriminatedUnion('event', [
  z.strictObject({
    event: z.literal('record'),
    submission,
    /** Left out for a sheet of paper: it was written at the machine, whatever the run was on the board meanwhile. A run that is done refuses it. */
    revision: revision.optional(),
    figures,
    end,
    /** No more figures are coming. */
    isAll: z.boolean().default(false),
    source: z.enum(['board', 'paper']).default('board'),
  }),
  z.strictObject({
    event: z.literal('correct'),
    ...seen,
    figures,
    end,
    reason: z.string().trim().min(1).max(500),
  }),
  z.strictObject({ event: z.literal('make'), ...seen }),
  z.strictObject({ event: z.literal('confirm'), ...seen }),
  z.strictObject({ event: z.literal('deny'), ...seen }),
  z.strictObject({ event: z.literal('skip'), ...seen }),
  z.strictObject({ event: z.literal('put back'), ...seen }),
  z.strictObject({ event: z.literal('repeat'), ...seen }),
  z.strictObject({ event: z.literal('send now'), ...seen }),
  z.strictObject({ event: z.literal('hand over'), ...seen, personId: z.uuidv7() }),
  z.strictObject({ event: z.literal('note'), submission, words: z.string().trim().min(1).max(500) }),
  z.strictObject({
    event: z.literal('set actual'),
    ...seen,
    /** One value a setting, in the order of the plan. */
    actual: z.array(z.union([z.number().min(-1e12).max(1e12), z.string().trim().max(200)])).max(7),
  }),
]);
export type RunEventBody = z.output<typeof runEventSchema>;
export type RunEventInput = z.input<typeof runEventSchema>;

/** What a run is after an event, and what of it is still to come. */
export const runAnswerSchema = z.object({
  id: z.string(),
  state: z.enum(runStates),
  end: z.enum(runEnds).nullable(),
  revision: z.number(),
  missing: z.array(z.object({ result: z.number(), missing: z.number() })),
});
export type RunAnswer = z.output<typeof runAnswerSchema>;
