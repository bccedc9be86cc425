import { z } from 'zod';
import '../../people/schema-settings.ts';
import { readingSources, readingStates, runEnds, runStates } from '../../run/run.ts';
import { stretchKinds } from '../../run/stretch.ts';

const whole = z.number().int();
const count = whole.min(0).max(1_000_000);
const place = whole.min(1).max(100_000);

/** Milliseconds since 1970 in UTC. */
export const momentInFile = whole.min(0).max(8.64e15);
const moment = momentInFile.nullable();

export const mostRuns = 1_000;
const mostReadings = 1_000;

const setting = z.union([z.number(), z.string().max(200)]);

export const readingInFile = z.strictObject({
  /** 0: the main result; 1 to 3: the results to keep an eye on. */
  result: whole.min(0).max(3),
  /** Which part of the run, as it was counted when it was typed in. */
  part: count,
  /** The figure in the result’s unit, or the count of flaws. */
  value: z.number().nullable(),
  /** Rejected parts, for a result that counts rejects. */
  rejects: count.nullable(),
  /** Parts inspected. */
  lot: count.nullable(),
  state: z
    /** Only readings that count enter the analysis; the others are its history. */
    .enum(readingStates),
  source: z.enum(readingSources),
  /** Why it was corrected, where somebody said so. */
  reason: z.string().max(2_000).nullable(),
  /** The place, in this list, of the reading that it replaces. */
  replaces: count.nullable(),
  at: momentInFile,
});
export type ReadingInFile = z.output<typeof readingInFile>;

export const runInFile = z.strictObject({
  /** The plan (its n) that the run belongs to. */
  plan: place,
  /** What the run goes by on tags and in texts. */
  number: place,
  /** Its turn in the order of running. */
  place: place,
  block: whole.min(0).max(100_000),
  wholePlot: whole.min(0).max(100_000).nullable(),
  /** The same for runs with the same planned settings. */
  group: z.string().max(400),
  center: z.boolean(),
  /** Made to warm the machine up; it is not analyzed. */
  warmUp: z.boolean(),
  /** Planned settings, -1 at low and +1 at high; A first. */
  coded: z.array(z.number()).min(1).max(7),
  planned: z
    .array(setting)
    .min(1)
    /** Planned settings in their unit, or the name of the choice. */
    .max(7),
  /** Settings as reached, where they differ. */
  actual: z.array(setting).min(1).max(7).nullable(),
  state: z.enum(runStates),
  end: z.enum(runEnds).nullable(),
  gauge: z.string().max(400).nullable(),
  label: z.string().max(400).nullable(),
  /** The stretch (its n) in which it was made. */
  stretch: place.nullable(),
  /** The number of the run that it repeats. */
  repeats: place.nullable(),
  askedAt: moment,
  madeAt: moment,
  measuredAt: moment,
  closedAt: moment,
  /** All that were ever taken, oldest first. */
  readings: z.array(readingInFile).max(mostReadings),
});
export type RunInFile = z.output<typeof runInFile>;

export const stretchInFile = z.strictObject({
  n: place,
  kind: z.enum(stretchKinds),
  words: z.string().max(2_000),
  at: momentInFile,
});
