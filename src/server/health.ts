import { now } from './clock.ts';
import { database } from './db/connection.ts';
import { lastWorkerBeat } from './db/worker-leases.ts';

const silenceLimit = 60_000;

/** Whether the database answers and a worker has been alive within the last minute. */
export async function readHealth(): Promise<boolean> {
  try {
    const beatAt = await lastWorkerBeat(database());
    // A clock moved by hand in the demo may put the beat ahead of us; that worker is alive too.
    return beatAt !== null && Math.abs(now() - beatAt) < silenceLimit;
  } catch {
    return false;
  }
}
