import { z } from 'zod';
import { textStandings } from '../message/monthly-texts.ts';
import '../people/schema-settings.ts';
import { trialEvents, trialStates } from '../trial/trial-states.ts';
import { problemKinds } from './problem-kinds.ts';
import { readingSources, readingStates, runEnds, runStates } from './run.ts';
import { runEvents } from './run-states.ts';
import { stretchKinds } from './stretch.ts';

const value = z.union([z.number(), z.string()]);
const person = z.object({ id: z.string(), name: z.string() });

const figure = {
  result: z.number(),
  part: z.number(),
  value: z.number().nullable(),
  rejects: z.number().nullable(),
  lot: z.number().nullable(),
};

/** A run as a tag shows it. Moments are milliseconds UTC. */
export const boardRunSchema = z.object({
  id: z.string(),
  number: z.number(),
  block: z.number(),
  center: z.boolean(),
  warmUp: z.boolean(),
  /** -1 low, 0 middle, 1 high; of each setting. */
  coded: z.array(z.number()),
  planned: z.array(value),
  actual: z.array(value).nullable(),
  state: z.enum(runStates),
  end: z.enum(runEnds).nullable(),
  revision: z.number(),
  /** Who makes it and who measures it; null: decided when its turn comes. */
  person: person.nullable(),
  measurer: person.nullable(),
  label: z.string().nullable(),
  /** The number of the run that this one repeats. */
  repeats: z.number().nullable(),
  askedAt: z.number().nullable(),
  madeAt: z.number().nullable(),
  measuredAt: z.number().nullable(),
  closedAt: z.number().nullable(),
  /** The figures that count, and those that are asked back. */
  figures: z.array(z.object({ ...figure, isAskedBack: z.boolean() })),
  photos: z.array(
    z.object({ id: z.string(), width: z.number(), height: z.number(), at: z.number(), by: z.string() }),
  ),
  /** Why nobody may ever answer for it: texts do not arrive, or all reminders are used up. */
  unanswered: z.enum(['undelivered', 'reminded']).nullable(),
  /** What this reader may do with it now. */
  events: z.array(z.enum(runEvents)),
});
export type BoardRun = z.output<typeof boardRunSchema>;

export const resultItemSchema = z.object({
  result: z.number(),
  name: z.string(),
  unit: z.string(),
  kind: z.enum(['measured', 'rejects', 'flaws']),
  parts: z.number(),
  lot: z.number().nullable(),
  step: z.number().nullable(),
});

export const boardSettingSchema = z.object({
  /** As the machine's panel shows it. */
  name: z.string(),
  kind: z.enum(['number', 'choice']),
  unit: z.string(),
  low: value,
  high: value,
  usual: value,
});
export type BoardSetting = z.output<typeof boardSettingSchema>;

/** GET /api/trials/:id/board. */
export const boardSchema = z.object({
  trialId: z.string(),
  number: z.number(),
  title: z.string(),
  machine: z.string(),
  phase: z.enum(['main', 'check']),
  state: z.enum(trialStates),
  revision: z.number(),
  /** Names this state of the board: the ETag of the answer. */
  stamp: z.string(),
  settings: z.array(boardSettingSchema),
  results: z.array(resultItemSchema),
  runs: z.array(boardRunSchema),
  /** Those that nobody has dealt with yet. */
  problems: z.array(
    z.object({
      id: z.string(),
      kind: z.enum(problemKinds),
      /** Whether no run goes out until it is dealt with. */
      blocks: z.boolean(),
      runNumber: z.number().nullable(),
      runId: z.string().nullable(),
      words: z.string(),
      by: z.string(),
      at: z.number(),
    }),
  ),
  stretches: z.array(
    z.object({ n: z.number(), kind: z.enum(stretchKinds), words: z.string(), at: z.number() }),
  ),
  /** Whether the usual settings are back on the machine; `asked`: not yet. */
  setBack: z.enum(['not due', 'asked', 'done']),
  /** The last stop for safety, while the trial is held: who was told, and how far each text got. */
  stop: z
    .object({
      at: z.number(),
      told: z.array(
        z.object({
          personId: z.string(),
          name: z.string(),
          text: z.enum(['on its way', 'sent', 'got', 'failed', 'no phone']),
          answeredAt: z.number().nullable(),
          /** Whether this reader may see the number. */
          mayCall: z.boolean(),
        }),
      ),
    })
    .nullable(),
  /** What this trial's texts came to so far, and how much of the shop's month is used; null: it has no limit. */
  texts: z.object({
    sent: z.number(),
    parts: z.number(),
    month: z.object({ used: z.number(), limit: z.number(), standing: z.enum(textStandings) }).nullable(),
  }),
  /** Everybody who may be given a run. */
  crew: z.array(person),
  minutesPerRun: z.number().nullable(),
  /** What this reader may do with the trial now. */
  events: z.array(z.enum(trialEvents)),
  mayRun: z.boolean(),
  mayRaise: z.boolean(),
  /** Whether an engineer or safety person must start it again. */
  resumeByReviewer: z.boolean(),
});
export type Board = z.output<typeof boardSchema>;

/** GET /api/runs/:id: all that happened to a run, oldest first. */
export const runStorySchema = z.object({
  id: z.string(),
  lines: z.array(
    z.discriminatedUnion('kind', [
      z.object({
        kind: z.literal('text'),
        at: z.number(),
        to: z.string(),
        body: z.string(),
        state: z.enum(['waiting', 'sending', 'unsure', 'sent', 'delivered', 'failed', 'cancelled']),
      }),
      z.object({ kind: z.literal('reply'), at: z.number(), by: z.string(), body: z.string() }),
      z.object({ kind: z.literal('note'), at: z.number(), by: z.string(), words: z.string() }),
      z.object({
        kind: z.literal('reading'),
        at: z.number(),
        by: z.string(),
        ...figure,
        state: z.enum(readingStates),
        source: z.enum(readingSources),
        reason: z.string().nullable(),
      }),
    ]),
  ),
});
export type RunStory = z.output<typeof runStorySchema>;
export type StoryLine = RunStory['lines'][number];
