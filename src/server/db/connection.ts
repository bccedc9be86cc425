import { mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import type { Database as SqliteConnection } from 'better-sqlite3';
import knex, { type Knex } from 'knex';
import { type Config, config } from '../env.ts';
import { makeTransactionsImmediate } from './immediate-transactions.ts';

/** How long a statement waits for another process's write before it fails, in milliseconds. */
const busyTimeout = 10_000;

function prepareSqlite(
  connection: SqliteConnection,
  done: (error: Error | null, connection: unknown) => void,
) {
  connection.pragma('journal_mode = WAL');
  connection.pragma('synchronous = NORMAL');
  connection.pragma('foreign_keys = ON');
  connection.pragma(`busy_timeout = ${busyTimeout}`);
  done(null, connection);
}

/** Knex settings for a database; shared by the process, the knexfile and the tests. */
export function knexSettings(database: Config['database']): Knex.Config {
  if (database.kind === 'postgres') {
    return { client: 'pg', connection: database.url, pool: { min: 1, max: 8 }, compileSqlOnError: false };
  }
  mkdirSync(dirname(database.file), { recursive: true });
  return {
    client: 'better-sqlite3',
    connection: { filename: database.file },
    useNullAsDefault: true,
    // One connection: two in one thread freeze each other, as the driver waits without letting the other finish.
    pool: { min: 1, max: 1, afterCreate: prepareSqlite },
    // Error messages then carry the statement with its placeholders, never the bound values.
    compileSqlOnError: false,
  };
}

/** Opens a handle of its own: for `database()`, for commands and for tests. */
export function openDatabase(at: Config['database']): Knex {
  const db = knex(knexSettings(at));
  if (at.kind === 'sqlite') makeTransactionsImmediate(db);
  return db;
}

const key = Symbol.for('trywell.db');
const holder = globalThis as { [key]?: Knex };

/**
 * The one database handle of this process. It lives on `globalThis` because the process holds two bundles (main and
 * the pages), and each would otherwise open its own.
 */
export function database(): Knex {
  holder[key] ??= openDatabase(config().database);
  return holder[key];
}

/** Closes the handle; the next `database()` opens a new one. */
export async function closeDatabase(): Promise<void> {
  const open = holder[key];
  delete holder[key];
  await open?.destroy();
}
