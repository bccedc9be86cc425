import { now } from '../server/clock.ts';
import type { Job } from './loop.ts';

/** Says that a worker is alive, for `/api/health` and for the warning that texts are not going out. */
export const beat: Job = {
  name: 'beat',
  everyMilliseconds: 5_000,
  async run({ db, workerId }) {
    const at = now();
    const row = { name: 'worker', holder: workerId, until: at, beat_at: at };
    await db('worker_leases').insert(row).onConflict('name').merge();
    return 0;
  },
};
