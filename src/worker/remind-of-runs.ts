import { remindOfRuns } from '../features/run/remind.service.ts';
import { holdLease } from './lease.ts';
import type { Job } from './loop.ts';

/** Reminds of open runs, and tells the person on call where nobody answers. */
export const remind: Job = {
  name: 'remind',
  everyMilliseconds: 30_000,
  async run(context) {
    if (!(await holdLease(context, 'remind', 60_000))) return 0;
    return remindOfRuns(context.db);
  },
};
