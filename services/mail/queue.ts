import * as outbox from '../outbox';
import { parse } from '../problem';
import type { Tx } from '../record';
import { type MailKind, type MailPayload, payloads } from './kinds';

/**
 * Step: queues a mail with the change that causes it. Committed together or not at all; the worker sends it.
 * @param key what the mail is about: a second one of the same kind and key is not queued
 */
export async function queue<K extends MailKind>(tx: Tx, kind: K, payload: MailPayload<K>, key: string): Promise<void> {
  const of = parse(payloads[kind], payload);
  await outbox.queue(tx, { kind: 'mail', key: `${kind}:${key}`, payload: { mail: kind, of } });
}
