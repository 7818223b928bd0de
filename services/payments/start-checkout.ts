import Stripe from 'stripe';
import type { Actor } from '../access';
import { type PaymentAttempt, noteSession, openAttempt, openOrder } from '../orders';
import { log } from '../log';
import { OrderRef } from '../orders/schemas';
import { Problem, parse, refused } from '../problem';
import { reading, write } from '../record';
import { stripe } from './client';
import { openSession } from './open-session';

/**
 * Gives the address of the payment page for an order: the one that is still open, or a new one. Refused when the order
 * is paid, cancelled, or its stock has gone.
 */
export async function startCheckout(actor: Actor, input: OrderRef): Promise<{ url: string }> {
  const ref = parse(OrderRef, input);
  const order = await openOrder(reading(), actor, 'order.pay', ref);
  const open = order.payment === 'awaiting-payment' && order.sessionId ? await stillOpen(order.sessionId) : null;
  if (open) return { url: open };

  let attempt = await begin(actor, ref, order.sessionId === null ? null : order.sessionAttempt);
  let session = await ask(attempt);
  if (session === 'refused') {
    attempt = await begin(actor, ref, attempt.attempt);
    session = await ask(attempt);
  }
  if (session === 'refused') throw unavailable();
  const { orderId, attempt: number } = attempt;
  const { id: sessionId, url } = session;
  if (await write(actor, (tx) => noteSession(tx, { orderId, attempt: number, sessionId }))) return { url };
  // Nobody may pay on a page of an order that was cancelled or paid while the provider made it.
  await closePage(sessionId);
  throw refused('This order has just changed. Read it again, then decide.');
}

function begin(actor: Actor, ref: OrderRef, over: number | null): Promise<PaymentAttempt> {
  return write(actor, (tx) => openAttempt(tx, actor, ref, { over }));
}

async function closePage(sessionId: string): Promise<void> {
  await stripe()
    .checkout.sessions.expire(sessionId)
    .catch((error: unknown) => {
      // It may be closed or paid already; what comes in for it is put before a person.
      log().warn({ error }, 'a payment page that nobody should use was not closed');
    });
}

/** Only a definite answer lets a new key be used; after silence the same key has to be asked again. */
async function ask(attempt: PaymentAttempt): Promise<{ id: string; url: string } | 'refused'> {
  try {
    return await openSession(attempt);
  } catch (error) {
    if (isRefusal(error)) return 'refused';
    throw translated(error);
  }
}

async function stillOpen(sessionId: string): Promise<string | null> {
  const session = await stripe()
    .checkout.sessions.retrieve(sessionId)
    .catch((error: unknown) => {
      throw translated(error);
    });
  if (session.status === 'complete') {
    throw refused('Your payment has been made and is being confirmed. This page says so in a moment.');
  }
  return session.status === 'open' ? session.url : null;
}

/** A 500 counts: it is repeated under its key for a day, and a page whose address nobody got is paid by nobody. */
const isRefusal = (error: unknown) =>
  error instanceof Stripe.errors.StripeInvalidRequestError ||
  error instanceof Stripe.errors.StripeIdempotencyError ||
  (error instanceof Stripe.errors.StripeAPIError && error.statusCode === 500);

const unavailable = () =>
  new Problem(
    'unavailable',
    'The payment page did not answer. Nothing was taken, and your kits stay set aside. Try again in a minute.',
  );

export const translated = (error: unknown): unknown =>
  error instanceof Stripe.errors.StripeError ? Object.assign(unavailable(), { cause: error }) : error;
