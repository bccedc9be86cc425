import { now } from './clock.ts';
import { database } from './db/connection.ts';

const silenceLimit = 60_000;

/** When a worker last said that it is alive, in milliseconds UTC; null when none ever did. */
export async function lastWorkerBeat(): Promise<number | null> {
  const row = await database()('worker_leases').where({ name: 'worker' }).first('beat_at');
  return row ? Number(row.beat_at) : null;
}

/** Whether the database answers and a worker has been alive within the last minute. */
export async function readHealth(): Promise<boolean> {
  try {
    const beatAt = await lastWorkerBeat();
    // A clock moved by hand in the demo may put the beat ahead of us; that worker is alive too.
    return beatAt !== null && Math.abs(now() - beatAt) < silenceLimit;
  } catch {
    return false;
  }
}
