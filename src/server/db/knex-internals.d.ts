// Knex ships no types for its dialects' inner classes; these are the members that `immediate-transactions.ts` builds on.
declare module 'knex/lib/dialects/sqlite3/execution/sqlite-transaction.js' {
  export default class Transaction_Sqlite {
    constructor(client: unknown, container: unknown, config: unknown, outerTransaction: unknown);
    begin(connection: unknown): Promise<unknown>;
    query(connection: unknown, sql: string): Promise<unknown>;
  }
}
