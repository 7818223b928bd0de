import type { Knex } from 'knex';

/** What is used of the driver's connection. */
interface Connection {
  exec(text: string): unknown;
}

interface QueryingClient {
  query(...args: unknown[]): Promise<unknown>;
}

/** Lets the connection fail at its n-th statement from now on, as if the process died there: nothing later is done. */
export function crashAfter(sql: Knex, statements: number): void {
  let left = statements;
  const prototype = prototypeOf(sql);
  const query = inherited(prototype);
  prototype.query = function (this: unknown, ...args: unknown[]) {
    const [connection, asked] = args as [Connection, unknown];
    const text = JSON.stringify(asked ?? '');
    if (/rollback/i.test(text) || --left > 0) return query.apply(this, args);
    // What the database does by itself when its process is gone.
    if (/commit/i.test(text)) connection.exec('ROLLBACK');
    return Promise.reject(new Error('The process died here.'));
  };
}

export function stopCrashing(sql: Knex): void {
  Reflect.deleteProperty(prototypeOf(sql), 'query');
}

/** A transaction's client is made anew from the class, so that the class is where a fuse goes in. */
function prototypeOf(sql: Knex): QueryingClient {
  return Object.getPrototypeOf(sql.client) as QueryingClient; // Knex types its client as `any`
}

function inherited(prototype: QueryingClient): QueryingClient['query'] {
  Reflect.deleteProperty(prototype, 'query');
  return prototype.query;
}
