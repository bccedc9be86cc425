import { recordWorkerBeat } from '../server/db/worker-leases.ts';
import type { Job } from './loop.ts';

/** Says that a worker is alive, for `/api/health` and for the warning that texts are not going out. */
export const beat: Job = {
  name: 'beat',
  everyMilliseconds: 5_000,
  async run({ db, workerId }) {
    await recordWorkerBeat(db, workerId);
    return 0;
  },
};
