import { forgetOldWords } from '../features/message/retention.service.ts';
import { holdLease } from './lease.ts';
import type { Job } from './loop.ts';

const day = 24 * 60 * 60_000;

/** Once a day: words whose time is over. */
export const retention: Job = {
  name: 'retention',
  everyMilliseconds: day,
  async run(context) {
    if (!(await holdLease(context, 'retention', day / 2))) return 0;
    await forgetOldWords(context.db);
    return 0;
  },
};
