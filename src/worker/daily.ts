import { now } from '../server/clock.ts';
import { readAppState, writeAppState } from '../server/db/app-state.ts';
import { holdLease } from './lease.ts';
import type { Job, JobContext } from './loop.ts';

const look = 10 * 60_000;
const longestPass = 15 * 60_000;

/**
 * A job that one worker does once a day. The day it was last done is kept, so that a restart does not do it again; a day
 * on which it failed is tried again at the next look.
 * @param work gets the day as `2026-12-01` (UTC)
 */
export function daily(name: string, work: (context: JobContext, day: string) => Promise<void>): Job {
  const key = `daily:${name}`;
  return {
    name,
    everyMilliseconds: look,
    async run(context) {
      const day = new Date(now()).toISOString().slice(0, 10);
      if ((await readAppState(context.db, key)) === day) return 0;
      if (!(await holdLease(context, name, longestPass))) return 0;
      await work(context, day);
      await writeAppState(context.db, key, day);
      return 0;
    },
  };
}
