import type { Knex } from 'knex';

/**
 * Runs `work` with a scope whose handle is one transaction: all of its writes happen or none. Within a transaction
 * already begun it joins that one. Nothing slow (network, hashing, simulation) belongs inside, and the handle it is given is
 * the only one that may be used there: on SQLite the process has a single connection, and the transaction holds it.
 */
export async function inTransaction<Scope extends { readonly db: Knex }, Result>(
  scope: Scope,
  work: (scope: Scope) => Promise<Result>,
): Promise<Result> {
  if (scope.db.isTransaction) return work(scope);
  return scope.db.transaction((transaction) => work({ ...scope, db: transaction }));
}
