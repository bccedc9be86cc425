import type { Knex } from 'knex';
import { RateLimiterRes } from 'rate-limiter-flexible';
import RateLimiterStore, { type StoredPoints } from 'rate-limiter-flexible/lib/RateLimiterStoreAbstract.js';
import { z } from 'zod';
import { now } from '../clock.ts';
import { moment } from '../db/columns.ts';
import { database } from '../db/connection.ts';

const pointsRow = z.object({ points: z.number(), expire: moment.nullable() });

/**
 * Counts tries in the table `rate_limits`, so that all processes share one count. The package's own SQL store asks the
 * machine for the time and speaks to SQLite alone; this one goes by the product's clock and by portable queries. Never call
 * it inside a transaction: it uses the connection that the transaction holds.
 */
export class RateLimiter extends RateLimiterStore {
  constructor(limit: { name: string; tries: number; seconds: number }) {
    super({ storeClient: database, keyPrefix: limit.name, points: limit.tries, duration: limit.seconds });
  }

  protected override async _upsert(
    key: string,
    points: number,
    milliseconds: number,
    forceExpire = false,
  ): Promise<StoredPoints> {
    const db = database();
    const at = now();
    const query = db('rate_limits')
      .insert({ key, points, expire: milliseconds > 0 ? at + milliseconds : null })
      .onConflict('key');
    const merged = forceExpire ? query.merge() : query.merge(countOnUnlessOver(db, at));
    const [row] = await merged.returning(['points', 'expire']);
    return pointsRow.parse(row);
  }

  protected override async _get(key: string): Promise<StoredPoints | null> {
    const row = await database()('rate_limits')
      .where({ key })
      .where((query) => query.whereNull('expire').orWhere('expire', '>', now()))
      .first('points', 'expire');
    return row ? pointsRow.parse(row) : null;
  }

  protected override async _delete(key: string): Promise<boolean> {
    return (await database()('rate_limits').where({ key }).delete()) > 0;
  }

  protected override _getRateLimiterRes(
    _key: string,
    changedPoints: number,
    stored: StoredPoints,
  ): RateLimiterRes {
    const untilForgotten = stored.expire === null ? -1 : Math.max(stored.expire - now(), 0);
    return new RateLimiterRes(
      Math.max(this.points - stored.points, 0),
      untilForgotten,
      stored.points,
      stored.points === changedPoints,
    );
  }
}

function countOnUnlessOver(db: Knex, at: number): Record<string, Knex.Raw> {
  return {
    points: db.raw(
      'case when rate_limits.expire is null or rate_limits.expire > ? then rate_limits.points + excluded.points else excluded.points end',
      [at],
    ),
    expire: db.raw(
      'case when rate_limits.expire is null or rate_limits.expire > ? then rate_limits.expire else excluded.expire end',
      [at],
    ),
  };
}
