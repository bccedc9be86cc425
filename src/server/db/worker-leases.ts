import type { Knex } from 'knex';
import { now } from '../clock.ts';

/** A worker that wants to be the only one doing something for a while. */
export interface LeaseWish {
  name: string;
  holder: string;
  milliseconds: number;
}

/**
 * Takes or renews the lease of that name.
 * @returns false while another worker holds it
 */
export async function takeLease(db: Knex, { name, holder, milliseconds }: LeaseWish): Promise<boolean> {
  const at = now();
  const row = { holder, until: at + milliseconds, beat_at: at };
  const taken = await db('worker_leases')
    .where({ name })
    .andWhere((free) => free.where('until', '<', at).orWhere('holder', holder))
    .update(row);
  if (taken > 0) return true;
  const added = await db('worker_leases')
    .insert({ name, ...row })
    .onConflict('name')
    .ignore()
    .returning('name');
  return added.length > 0;
}

/** Writes down that a worker is alive. */
export async function recordWorkerBeat(db: Knex, holder: string): Promise<void> {
  const at = now();
  const row = { name: 'worker', holder, until: at, beat_at: at };
  await db('worker_leases').insert(row).onConflict('name').merge();
}

/** When a worker last said that it is alive, in milliseconds UTC; null when none ever did. */
export async function lastWorkerBeat(db: Knex): Promise<number | null> {
  const row = await db('worker_leases').where({ name: 'worker' }).first('beat_at');
  return row ? Number(row.beat_at) : null;
}
