import { askDueRuns } from '../features/run/remind.service.ts';
import { holdLease } from './lease.ts';
import type { Job } from './loop.ts';

/** Sends each running trial its next run, when it is its turn. */
export const askNextRuns: Job = {
  name: 'ask-next-runs',
  everyMilliseconds: 5_000,
  async run(context) {
    // Two workers would do no harm, but would refuse each other's steps.
    if (!(await holdLease(context, 'ask-next-runs', 15_000))) return 0;
    return askDueRuns(context.db);
  },
};
