import type { Actor } from '../access';
import { readFrozen } from '../kits';
import type { OrderId } from '../ids';
import type { Money } from '../money';
import { money } from '../money';
import { refused } from '../problem';
import { type Tx, record } from '../record';
import { liveReservation, needsOf, reserve } from '../stock';
import type { Instant } from '../time';
import { openOrder } from './order-access';
import { reservedFor } from './place-order';
import * as rows from './rows';
import { mayPay } from './rules';
import type { OrderRef } from './schemas';

/** Everything a payment page is asked for with, from our own rows. */
export interface PaymentAttempt {
  orderId: OrderId;
  number: string;
  email: string;
  attempt: number;
  lines: { name: string; unit: Money; quantity: number }[];
  delivery: { name: string; price: Money };
  total: Money;
  /** Until when the stock is kept. */
  keptUntil: Instant;
}

/**
 * Step: opens the next try to pay, or the last one again if the provider never answered it, so that the same key asks
 * for the same page. Sets stock aside anew where the reservation has lapsed, which may be refused.
 * @param over the try that is known to be over, if one is; somebody who comes second gets the page that the first opened
 */
export async function openAttempt(
  tx: Tx,
  actor: Actor,
  ref: OrderRef,
  { over }: { over: number | null },
): Promise<PaymentAttempt> {
  const order = await openOrder(tx.sql, actor, 'order.pay', ref);
  if (!mayPay(order)) throw refused(whyNot(order));
  const live = await liveReservation(tx.sql, order.id);
  const isUnderWay = order.sessionAttempt > 0 && order.sessionAttempt !== over;
  if (isUnderWay && live && live.expiresAt > tx.now) {
    return describe(tx, order, order.sessionAttempt, live.expiresAt);
  }
  const keptUntil = tx.now + reservedFor;
  await reserve(tx, { orderId: order.id, needs: await needsOfOrder(tx, order.id), expiresAt: keptUntil });
  const attempt = order.sessionAttempt + 1;
  const changed = await tx
    .sql('orders')
    .where({ id: order.id, payment: 'awaiting-payment', session_attempt: order.sessionAttempt })
    .update({ session_attempt: attempt, session_id: null });
  if (changed === 0) throw refused('This order has just changed. Read it again.');
  await record(tx, 'order.payment-asked', {
    subject: { kind: 'order', id: order.id },
    before: { attempt: order.sessionAttempt },
    after: { attempt, keptUntil },
  });
  return describe(tx, order, attempt, keptUntil);
}

function whyNot(order: rows.Order): string {
  return order.payment === 'cancelled'
    ? 'This order was cancelled. Put the kits into your basket again.'
    : 'This order is paid already. Nothing more is to pay.';
}

async function describe(tx: Tx, order: rows.Order, attempt: number, keptUntil: Instant): Promise<PaymentAttempt> {
  const delivery = (await rows.deliveries(tx.sql)).find((method) => method.code === order.deliveryCode);
  return {
    orderId: order.id,
    number: order.number,
    email: order.email,
    attempt,
    lines: (await rows.linesOf(tx.sql, order.id)).map(({ name, kitNumber, letter, unitMinor, quantity }) => ({
      name: `${name}, No. ${kitNumber} ${letter}`,
      unit: money(unitMinor, order.currency),
      quantity,
    })),
    delivery: { name: delivery?.name ?? 'Delivery', price: order.delivery },
    total: order.total,
    keptUntil,
  };
}

async function needsOfOrder(tx: Tx, orderId: string): Promise<Map<string, number>> {
  const needs = new Map<string, number>();
  for (const { versionId, quantity, name, letter } of await rows.linesOf(tx.sql, orderId)) {
    const { content, state } = await readFrozen(tx.sql, versionId);
    if (state !== 'released') {
      throw refused(`${name} ${letter} was withdrawn meanwhile. Cancel this order and look for a newer version.`);
    }
    for (const [partId, each] of await needsOf(tx.sql, content)) {
      needs.set(partId, (needs.get(partId) ?? 0) + each * quantity);
    }
  }
  return needs;
}

/** Step: notes the payment page that the provider opened for a try; false when the order has moved on meanwhile. */
export async function noteSession(
  tx: Tx,
  noted: { orderId: string; attempt: number; sessionId: string },
): Promise<boolean> {
  const changed = await tx
    .sql('orders')
    .where({ id: noted.orderId, session_attempt: noted.attempt, payment: 'awaiting-payment' })
    .update({ session_id: noted.sessionId });
  return changed === 1;
}
