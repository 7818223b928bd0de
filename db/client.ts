import 'server-only';
import { mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import knex, { type Knex } from 'knex';
import BetterSqlite3Client from 'knex/lib/dialects/better-sqlite3/index.js';
import SqliteTransaction from 'knex/lib/dialects/sqlite3/execution/sqlite-transaction.js';

/** What is used of the driver's connection. */
interface Connection {
  inTransaction: boolean;
  exec(sql: string): unknown;
  pragma(text: string): unknown;
}

/**
 * Takes the write lock when a transaction starts. A deferred one that reads first and writes later fails at once
 * when somebody committed in between, whatever the timeout. Nested transactions stay savepoints.
 */
class ImmediateTransaction extends SqliteTransaction {
  override begin(connection: Connection): Promise<unknown> {
    // A commit that failed, for want of disk space say, leaves its transaction open on the pooled connection.
    if (connection.inTransaction) connection.exec('ROLLBACK');
    return this.query(connection, 'BEGIN IMMEDIATE;');
  }
}

class Client extends BetterSqlite3Client {
  override transaction(...args: unknown[]): ImmediateTransaction {
    return new ImmediateTransaction(this, ...args);
  }
}

export interface OpenOptions {
  /** How long a statement waits for another process's lock, inside the call: short in the web process. */
  busyTimeoutMs?: number;
  acquireTimeoutMs?: number;
}

/** Settings that every connection has; `pragmasOf` reads them back. */
function settle(db: Connection, busyTimeoutMs: number): void {
  db.pragma('journal_mode = WAL');
  // The driver is built with NORMAL for WAL files, which may lose paid orders in a power cut.
  db.pragma('synchronous = FULL');
  db.pragma('foreign_keys = ON');
  db.pragma('trusted_schema = OFF');
  db.pragma(`busy_timeout = ${busyTimeoutMs}`);
}

export function openDatabase(filename: string, options: OpenOptions = {}): Knex {
  if (filename !== ':memory:') mkdirSync(dirname(filename), { recursive: true });
  return knex(databaseConfig(filename, options));
}

export function databaseConfig(filename: string, options: OpenOptions = {}): Knex.Config {
  const busyTimeoutMs = options.busyTimeoutMs ?? 250;
  return {
    client: Client,
    connection: { filename },
    useNullAsDefault: true,
    acquireConnectionTimeout: options.acquireTimeoutMs ?? 10_000,
    pool: {
      min: 1,
      max: 1,
      afterCreate(db: Connection, done: (error: Error | null, db: Connection) => void) {
        try {
          settle(db, busyTimeoutMs);
          done(null, db);
        } catch (error) {
          done(error instanceof Error ? error : new Error(String(error)), db);
        }
      },
    },
  };
}

/** One database a process; opened on first use, never while the product is being built. */
const holder = globalThis as typeof globalThis & { coilyardDatabase?: Knex };

export function database(): Knex {
  if (process.env['NEXT_PHASE'] === 'phase-production-build') {
    throw new Error('The database is not opened during a build.');
  }
  holder.coilyardDatabase ??= openDatabase(filenameFromEnv());
  return holder.coilyardDatabase;
}

/** Lets worker, commands and tests choose the file and the waiting time. */
export function setDatabase(sql: Knex | undefined): void {
  if (sql) holder.coilyardDatabase = sql;
  else delete holder.coilyardDatabase;
}

function filenameFromEnv(): string {
  const filename = process.env['COILYARD_DATABASE'];
  if (!filename) throw new Error('COILYARD_DATABASE is not set: name the SQLite file.');
  return filename;
}
