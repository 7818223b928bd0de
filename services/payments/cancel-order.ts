import Stripe from 'stripe';
import type { Actor } from '../access';
import { log } from '../log';
import { cancel, openOrder, readOrder } from '../orders';
import { OrderRef, type OrderView } from '../orders/schemas';
import { parse, refused } from '../problem';
import { reading, write } from '../record';
import { stripe } from './client';
import { payBack } from './pay-back';
import { translated } from './start-checkout';

/**
 * Cancels an order before it is packed. An open payment page is closed first, so that nobody pays for a cancelled
 * order; money that was taken goes back to the card it came from.
 */
export async function cancelOrder(actor: Actor, input: OrderRef): Promise<OrderView> {
  const ref = parse(OrderRef, input);
  const order = await openOrder(reading(), actor, 'order.cancel', ref);
  if (order.payment === 'awaiting-payment' && order.sessionId) await closePage(order.sessionId);

  await write(actor, async (tx) => {
    const { id } = await openOrder(tx.sql, actor, 'order.cancel', ref);
    await cancel(tx, id);
  });
  // The order is cancelled whatever the provider answers; the reconciler asks again until the money is back.
  await payBack(order.id).catch((error: unknown) => {
    log().warn({ order: order.id, error: String(error) }, 'the refund is asked for again later');
  });
  return readOrder(actor, ref);
}

async function closePage(sessionId: string): Promise<void> {
  try {
    const session = await stripe().checkout.sessions.retrieve(sessionId);
    if (session.status === 'expired') return;
    if (session.status === 'open') {
      await stripe().checkout.sessions.expire(sessionId);
      return;
    }
  } catch (error) {
    if (!(error instanceof Stripe.errors.StripeInvalidRequestError)) throw translated(error);
  }
  throw refused(
    'A payment for this order is just being confirmed. Wait a moment, then cancel it and get your money back.',
  );
}
