/** Knex ships no types for its client and transaction classes; this states what `client.ts` uses of them. */
declare module 'knex/lib/dialects/better-sqlite3/index.js' {
  import { Knex } from 'knex';
  export default class BetterSqlite3Client extends Knex.Client {
    transaction(...args: unknown[]): Knex.Transaction;
  }
}
declare module 'knex/lib/dialects/sqlite3/execution/sqlite-transaction.js' {
  import type { Knex } from 'knex';
  interface Internals {
    query(connection: unknown, sql: string): Promise<unknown>;
    // `never`: each driver hands in a connection of its own kind.
    begin(connection: never): Promise<unknown>;
  }
  const SqliteTransaction: new (...args: unknown[]) => Internals & Knex.Transaction;
  export default SqliteTransaction;
}
