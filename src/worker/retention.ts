import { forgetOldWords } from '../features/message/retention.service.ts';
import { forgetDeadEntries } from '../server/auth/forget-dead.ts';
import { holdLease } from './lease.ts';
import type { Job } from './loop.ts';

const day = 24 * 60 * 60_000;

/** Once a day: words whose time is over, and links and sessions that open nothing any more. */
export const retention: Job = {
  name: 'retention',
  everyMilliseconds: day,
  async run(context) {
    if (!(await holdLease(context, 'retention', day / 2))) return 0;
    await forgetOldWords(context.db);
    await forgetDeadEntries(context.db);
    return 0;
  },
};
