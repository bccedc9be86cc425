import type { Knex } from 'knex';
import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import { newId } from '../../server/ids.ts';

const shopRow = z.object({ id: z.string(), name: z.string(), created_at: moment, people: moment });

/** A shop as the person at the server sees it. */
export interface InstalledShop {
  id: string;
  /** Empty until the set-up where the shop was announced without a name. */
  name: string;
  createdAt: number;
  /** None until somebody has used the set-up link. */
  people: number;
}

/** All shops of this installation, the oldest first. */
export async function findShops(db: Knex): Promise<InstalledShop[]> {
  const rows: unknown = await db('shops')
    .leftJoin('people', 'people.shop_id', 'shops.id')
    .groupBy('shops.id', 'shops.name', 'shops.created_at')
    .orderBy(['shops.created_at', 'shops.id'])
    .select('shops.id', 'shops.name', 'shops.created_at')
    .count('people.id as people');
  return z
    .array(shopRow)
    .parse(rows)
    .map(({ created_at, ...shop }) => ({ ...shop, createdAt: created_at }));
}

/** Adds a shop that waits for its set-up, with values that the set-up replaces. @returns its id */
export async function insertAnnouncedShop(db: Knex, name: string): Promise<string> {
  const id = newId();
  const at = now();
  await db('shops').insert({
    id,
    name,
    time_zone: 'UTC',
    language: 'en',
    currency: 'USD',
    created_at: at,
    updated_at: at,
  });
  return id;
}
