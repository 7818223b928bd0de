import { type Actor, must } from '../access';
import { type Tx, record, write } from '../record';
import type { Instant } from '../time';
import type { JobKind } from './queue';
import { claimFor, waitBeforeRetry } from './rules';

export interface Job {
  id: string;
  kind: JobKind;
  payload: unknown;
  /** How often it was begun, this time included. */
  attempts: number;
  claimedUntil: Instant;
}

interface Row {
  id: string;
  kind: JobKind;
  payload: string;
  attempts: number;
}

/**
 * Takes the job that has been due longest; no other worker gets it while the claim lasts. The bookkeeping of the
 * outbox is no change that anybody decides, so it leaves no line in the record; giving a job up does.
 */
export async function claimNext(actor: Actor, kind: JobKind): Promise<Job | null> {
  must(actor, 'outbox.work');
  return write(actor, async (tx) => {
    const row = await due(tx, kind)
      .orderBy('due_at')
      .orderBy('id')
      .first<Row | undefined>('id', 'kind', 'payload', 'attempts');
    if (!row) return null;
    const claimedUntil = tx.now + claimFor;
    const attempts = row.attempts + 1;
    const changed = await due(tx, kind).where({ id: row.id }).update({ claimed_until: claimedUntil, attempts });
    if (changed !== 1) return null;
    const payload: unknown = JSON.parse(row.payload);
    return { id: row.id, kind: row.kind, payload, attempts, claimedUntil };
  });
}

const due = (tx: Tx, kind: JobKind) =>
  tx
    .sql('outbox')
    .where({ state: 'waiting', kind })
    .andWhere('due_at', '<=', tx.now)
    .andWhere((free) => free.whereNull('claimed_until').orWhere('claimed_until', '<=', tx.now));

/** The job is done. Does nothing when the claim has passed to another worker meanwhile. */
export async function finish(actor: Actor, job: Job): Promise<void> {
  must(actor, 'outbox.work');
  await write(actor, async (tx) => {
    await held(tx, job).update({ state: 'done', done_at: tx.now, claimed_until: null, last_error: null });
  });
}

/** The job failed: it waits for a later try, or is given up after the last one and stands in the record. */
export async function putOff(actor: Actor, job: Job, why: string): Promise<{ givenUp: boolean }> {
  must(actor, 'outbox.work');
  return write(actor, async (tx) => {
    const wait = waitBeforeRetry(job.attempts);
    const last_error = why.slice(0, 500);
    if (wait !== null) {
      await held(tx, job).update({ due_at: tx.now + wait, claimed_until: null, last_error });
      return { givenUp: false };
    }
    const changed = await held(tx, job).update({ state: 'failed', done_at: tx.now, claimed_until: null, last_error });
    if (changed === 1) {
      const subject = { kind: 'job', id: job.id };
      await record(tx, 'job.given-up', { subject, after: { attempts: job.attempts }, reason: last_error });
    }
    return { givenUp: true };
  });
}

const held = (tx: Tx, job: Job) =>
  tx.sql('outbox').where({ id: job.id, state: 'waiting', claimed_until: job.claimedUntil });
