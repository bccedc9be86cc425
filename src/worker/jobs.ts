import { beat } from './beat.ts';
import type { Job } from './loop.ts';

/** Every job there is. A job that must not run in two workers at once takes a lease by its name (see `lease.ts`). */
export const jobs: Job[] = [beat];
