import type { Knex } from 'knex';
import SqliteTransaction from 'knex/lib/dialects/sqlite3/execution/sqlite-transaction.js';

class ImmediateTransaction extends SqliteTransaction {
  override begin(connection: unknown): Promise<unknown> {
    return this.query(connection, 'BEGIN IMMEDIATE;');
  }
}

/**
 * Makes transactions of a SQLite handle take the write lock at once. Knex opens them deferred: one that reads first and
 * writes later then fails on the spot when another process wrote in between, whatever the busy timeout is.
 */
export function makeTransactionsImmediate(db: Knex): void {
  const client: { transaction: unknown } = db.client;
  client.transaction = (container: unknown, config: unknown, outerTransaction: unknown) =>
    new ImmediateTransaction(client, container, config, outerTransaction);
}
