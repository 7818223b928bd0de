import { newId } from '../ids';
import type { Tx } from '../record';
import type { Instant } from '../time';

export type JobKind = 'mail';

/**
 * Puts a job beside the change that causes it, in the same transaction: committed together or not at all.
 * @param key makes the job unique: the same key a second time adds nothing
 */
export async function queue(
  tx: Tx,
  job: { kind: JobKind; key: string; payload: unknown; dueAt?: Instant },
): Promise<void> {
  await tx
    .sql('outbox')
    .insert({
      id: newId(),
      kind: job.kind,
      key: job.key,
      payload: JSON.stringify(job.payload),
      created_at: tx.now,
      due_at: job.dueAt ?? tx.now,
      attempts: 0,
      state: 'waiting',
      claimed_until: null,
      done_at: null,
      last_error: null,
    })
    .onConflict('key')
    .ignore();
}
