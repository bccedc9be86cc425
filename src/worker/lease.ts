import { takeLease } from '../server/db/worker-leases.ts';
import type { JobContext } from './loop.ts';

/**
 * Takes or renews the lease of that name for this worker.
 * @returns false while another worker holds it
 */
export function holdLease(context: JobContext, name: string, milliseconds: number): Promise<boolean> {
  return takeLease(context.db, { name, holder: context.workerId, milliseconds });
}
