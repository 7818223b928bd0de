import type { Knex } from 'knex';
import { database } from '@/db/client';
import { type Actor, nameOf, personIdOf } from '../access';
import { newId } from '../ids';
import { Problem, refused } from '../problem';
import type { Instant } from '../time';
import { canonicalJson, sha256 } from './canonical';

/** One write transaction: its connection, who acts, and the one moment that all of it carries. */
export interface Tx {
  sql: Knex.Transaction;
  actor: Actor;
  now: Instant;
}

const attempts = 5;

/** Moves with the tests' and the demo's clock; everything else reads the machine's. */
let clock: () => Instant = () => Date.now();
export function setClock(next: (() => Instant) | undefined): void {
  clock = next ?? (() => Date.now());
}
export const now = (): Instant => clock();

/** The connection for reads that no transaction needs. */
export const reading = (): Knex => database();

/** Whether the database answers a read just now. */
export async function isDatabaseOpen(): Promise<boolean> {
  try {
    await reading()('counters').select('name').first();
    return true;
  } catch {
    // Whatever keeps it from answering, the one who asks wants to know only that it does.
    return false;
  }
}

/**
 * Runs one deed's change as a transaction that holds the write lock from its start. A lock held by another process is
 * waited for a few times; then the reader is told to try again. Any throw rolls everything back.
 */
export async function write<T>(actor: Actor, change: (tx: Tx) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await database().transaction((sql) => change({ sql, actor, now: now() }));
    } catch (error) {
      if (!isBusy(error)) throw translate(error);
      if (attempt === attempts) {
        throw busy();
      }
      await new Promise((resolve) => setTimeout(resolve, 20 * attempt + Math.floor(Math.random() * 40)));
    }
  }
}

const busy = () => new Problem('busy', 'The yard is busy just now. Nothing was lost; try again in a moment.');

export interface Subject {
  kind: string;
  id: string;
}

/** Adds a line to the record of changes; each line carries the hash of the one before, so a removed line shows. */
export async function record(
  tx: Tx,
  action: string,
  change: { subject: Subject; before?: unknown; after?: unknown; reason?: string },
): Promise<void> {
  const last = await tx
    .sql('changes')
    .select('seq', 'hash')
    .orderBy('seq', 'desc')
    .first<{ seq: number; hash: string }>();
  const row = {
    seq: (last?.seq ?? 0) + 1,
    id: newId(),
    at: tx.now,
    actor_id: personIdOf(tx.actor),
    actor_name: nameOf(tx.actor),
    action,
    subject_kind: change.subject.kind,
    subject_id: change.subject.id,
    before: change.before === undefined ? null : canonicalJson(change.before),
    after: change.after === undefined ? null : canonicalJson(change.after),
    reason: change.reason ?? null,
    previous_hash: last?.hash ?? '',
  };
  await tx.sql('changes').insert({ ...row, hash: hashOfChange(row) });
}

export const hashOfChange = (row: object): string => sha256(canonicalJson(row));

const codeOf = (error: unknown): string =>
  typeof error === 'object' && error !== null && 'code' in error && typeof error.code === 'string' ? error.code : '';

const isBusy = (error: unknown) => codeOf(error).startsWith('SQLITE_BUSY');

/** Driver codes that mean something to a reader; what a rule should have caught stays an error of ours. */
function translate(error: unknown): unknown {
  const code = codeOf(error);
  // The one connection was not free in time: many ask at once, or somebody holds it.
  if (error instanceof Error && error.name === 'KnexTimeoutError') return busy();
  if (code === 'SQLITE_FULL' || code.startsWith('SQLITE_IOERR')) {
    return new Problem(
      'unavailable',
      'The storage is full, so nothing was written. Reading still works; tell the owner.',
    );
  }
  if (code === 'SQLITE_CONSTRAINT_UNIQUE' || code === 'SQLITE_CONSTRAINT_PRIMARYKEY') {
    return refused('That exists already. Look for it, or choose another name or code.');
  }
  return error;
}
