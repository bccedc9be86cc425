import { now } from '../server/clock.ts';
import type { JobContext } from './loop.ts';

/**
 * Takes or renews the lease of that name for this worker.
 * @returns false while another worker holds it
 */
export async function holdLease(context: JobContext, name: string, milliseconds: number): Promise<boolean> {
  const at = now();
  const row = { holder: context.workerId, until: at + milliseconds, beat_at: at };
  const taken = await context
    .db('worker_leases')
    .where({ name })
    .andWhere((free) => free.where('until', '<', at).orWhere('holder', context.workerId))
    .update(row);
  if (taken > 0) return true;
  const added = await context
    .db('worker_leases')
    .insert({ name, ...row })
    .onConflict('name')
    .ignore()
    .returning('name');
  return added.length > 0;
}
