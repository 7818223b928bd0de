import type Stripe from 'stripe';
import { log } from '../log';
import { Currency, type Money } from '../money';
import { bookRefund, findOrder, giveBackUnpaid, lookAt, markPaid, orderOfPayment } from '../orders';
import type { Tx } from '../record';

const idOf = (thing: string | { id: string } | null | undefined): string | null =>
  typeof thing === 'string' ? thing : (thing?.id ?? null);

function moneyOf(minor: number | null, currency: string | null): Money | null {
  const known = Currency.safeParse(currency?.toUpperCase());
  return minor !== null && known.success ? { minor, currency: known.data } : null;
}

/** Which order of ours an event is about; null when it is about none. */
export async function orderOf(tx: Tx, event: Stripe.Event): Promise<string | null> {
  const object = event.data.object;
  const named = 'metadata' in object ? object.metadata?.['order_id'] : undefined;
  if (named !== undefined) return (await findOrder(tx.sql, named))?.id ?? null;
  const intent = 'payment_intent' in object ? idOf(object.payment_intent) : null;
  return intent === null ? null : orderOfPayment(tx.sql, intent);
}

/** What an event does to its order. Kinds that mean nothing to us are noted in the log. */
export async function applyEvent(tx: Tx, event: Stripe.Event, orderId: string | null): Promise<void> {
  switch (event.type) {
    case 'checkout.session.completed':
    case 'checkout.session.async_payment_succeeded':
    case 'checkout.session.async_payment_failed':
    case 'checkout.session.expired':
      return applySession(tx, event.data.object, {
        orderId,
        hasFailed: event.type === 'checkout.session.async_payment_failed',
      });
    case 'charge.refunded': {
      const charge = event.data.object;
      const total = moneyOf(charge.amount_refunded, charge.currency);
      if (orderId && total) await bookRefund(tx, { orderId, charge: charge.id, total });
      return;
    }
    case 'charge.dispute.created':
      if (orderId)
        await lookAt(tx, orderId, 'The buyer disputes the payment at the bank. Answer the provider in time.');
      return;
    case 'payment_intent.payment_failed':
    case 'payment_intent.succeeded':
      return;
    default:
      log().info({ event: event.id, type: event.type }, 'an event that nothing here follows');
  }
}

/** Brings an order to where its payment page stands; the reconciler calls it with a page it has just looked up. */
export async function applySession(
  tx: Tx,
  session: Stripe.Checkout.Session,
  { orderId, hasFailed = false }: { orderId: string | null; hasFailed?: boolean },
): Promise<void> {
  if (!orderId) return;
  if (session.status === 'expired' || hasFailed) {
    return giveBackUnpaid(tx, { orderId, attempt: Number(session.metadata?.['attempt'] ?? 0) });
  }
  if (session.status !== 'complete' || session.payment_status !== 'paid') return;
  const amount = moneyOf(session.amount_total, session.currency);
  const reference = idOf(session.payment_intent);
  if (!amount || reference === null) {
    await lookAt(
      tx,
      orderId,
      `Payment page ${session.id} is complete, but says no amount. Compare it with the provider's list.`,
    );
    return;
  }
  await markPaid(tx, { orderId, reference, amount });
}
