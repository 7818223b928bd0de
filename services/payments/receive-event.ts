import { must, systemActor } from '../access';
import { env } from '../env';
import { invalid } from '../problem';
import { write } from '../record';
import { applyEvent, orderOf } from './apply-event';
import { stripe } from './client';
import * as rows from './rows';

/**
 * Takes an event of the payment provider. Its signature over the raw body is the key to this door: without it nothing
 * is read and nothing changes. An event's effects and its id are written together, so that it works once however often
 * it comes.
 */
export async function receiveEvent(body: string, signature: string | null): Promise<{ received: true }> {
  const event = verified(body, signature);
  await write(systemActor('stripe'), async (tx) => {
    must(tx.actor, 'order.mark-paid');
    if (await rows.hasEvent(tx.sql, event.id)) return;
    const orderId = await orderOf(tx, event);
    await rows.insertEvent(tx.sql, { id: event.id, type: event.type, orderId, receivedAt: tx.now });
    await applyEvent(tx, event, orderId);
  });
  return { received: true };
}

function verified(body: string, signature: string | null) {
  try {
    return stripe().webhooks.constructEvent(body, signature ?? '', env().STRIPE_WEBHOOK_SECRET);
  } catch {
    throw invalid('The signature of this message does not fit.');
  }
}
