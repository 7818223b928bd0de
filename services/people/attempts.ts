import type { Tx } from '../record';
import { Problem } from '../problem';
import { days, type Instant } from '../time';
import { waitAfter, windowOf } from './rules';

/** Thrown while somebody has to wait; carries how long, for the page and for Retry-After. */
export class TooSoon extends Problem {
  readonly seconds: number;

  constructor(ms: number) {
    const seconds = Math.max(1, Math.ceil(ms / 1000));
    super('busy', `Too many tries. Wait ${seconds} seconds, then try again. Nothing is locked.`);
    this.seconds = seconds;
  }
}

interface Counter {
  failures: number;
  not_before: number;
}

const read = (tx: Tx, key: string) =>
  tx.sql('attempts').where({ key }).first<Counter | undefined>('failures', 'not_before');

async function put(tx: Tx, key: string, counter: Counter): Promise<void> {
  await tx
    .sql('attempts')
    .insert({ key, failures: counter.failures, not_before: counter.not_before, updated_at: tx.now })
    .onConflict('key')
    .merge(['failures', 'not_before', 'updated_at']);
}

/**
 * Counts a try as failed before it is looked at, so that many at once cannot slip through together; a right answer
 * takes the count back. Refused while the wait of the earlier failures lasts.
 */
export async function countTry(tx: Tx, key: string): Promise<void> {
  const before = await read(tx, key);
  if (before && before.not_before > tx.now) throw new TooSoon(before.not_before - tx.now);
  const failures = Math.min((before?.failures ?? 0) + 1, 1_000_000);
  await put(tx, key, { failures, not_before: tx.now + waitAfter(failures) });
}

export async function forgetTries(tx: Tx, key: string): Promise<void> {
  await tx.sql('attempts').where({ key }).delete();
}

/** Counts against an allowance of a fixed window, "20 links an hour from one network address". */
export async function countInWindow(tx: Tx, key: string, rule: { most: number; window: number }): Promise<void> {
  const current = windowOf(tx.now, rule.window);
  const windowKey = `${key}:${current}`;
  const failures = ((await read(tx, windowKey))?.failures ?? 0) + 1;
  if (failures > rule.most) throw new TooSoon((current + 1) * rule.window - tx.now);
  await put(tx, windowKey, { failures, not_before: 0 });
}

/** Notes that a session is over until its own end has passed: nobody comes in with it any more. */
export async function endSessionUntil(tx: Tx, sessionId: string, until: Instant): Promise<void> {
  await put(tx, sessionKey(sessionId), { failures: 0, not_before: until });
}

export const sessionKey = (sessionId: string) => `session:${sessionId}`;

/** Counters nobody needs any more: a day old, and nothing waits for them. */
export async function clearOldTries(tx: Tx): Promise<void> {
  await tx
    .sql('attempts')
    .where('updated_at', '<', tx.now - days(1))
    .andWhere('not_before', '<', tx.now)
    .delete();
}
