import { must } from '../access';
import { newId } from '../ids';
import { type Money, money } from '../money';
import { type Tx, record } from '../record';
import { giveBack } from '../stock';
import { lookAt } from './look-at';
import * as rows from './rows';
import { fulfilmentMayBecome, paymentAfter } from './rules';

export interface Refunded {
  orderId: string;
  /** The provider's id of the charge. */
  charge: string;
  /** All that was ever paid back of this charge, so that reports may come twice or in any order. */
  total: Money;
}

/** Books what was paid back since the last report of this charge. */
export async function bookRefund(tx: Tx, { orderId, charge, total }: Refunded): Promise<void> {
  must(tx.actor, 'order.mark-paid');
  const order = await rows.findOrder(tx.sql, orderId);
  if (!order) return;
  if (total.currency !== order.currency) {
    await lookAt(tx, orderId, `A refund in ${total.currency} came in for an order in ${order.currency}.`);
    return;
  }
  const booked = await rows.refundedOfCharge(tx.sql, orderId, charge);
  const amount = money(total.minor - booked, total.currency);
  if (amount.minor <= 0) return;
  const reference = `${charge}/${total.minor}`;
  await rows.bookMoney(tx.sql, { id: newId(), orderId, kind: 'refunded', amount, reference, at: tx.now });
  await record(tx, 'order.refunded', { subject: { kind: 'order', id: orderId }, after: { reference, amount } });
  await settleRefunds(tx, orderId);
}

/** Lets the order's state follow its money. Paid back in full before it was packed, it is not packed any more. */
export async function settleRefunds(tx: Tx, orderId: string): Promise<void> {
  const order = await rows.getOrder(tx.sql, orderId);
  const { paidMinor, refundedMinor } = await rows.moneyOf(tx.sql, orderId);
  const isPaid = order.payment === 'paid' || order.payment === 'part-refunded';
  // What was paid beyond the total goes back first: who paid twice and got one payment back has paid.
  const beyond = Math.max(0, paidMinor - order.total.minor);
  const payment = paymentAfter(paidMinor - beyond, Math.max(0, refundedMinor - beyond));
  if (!isPaid || payment === order.payment || payment === 'awaiting-payment') return;

  const stops = payment === 'refunded' && fulfilmentMayBecome(order.fulfilment, 'cancelled');
  const fulfilment = stops ? 'cancelled' : order.fulfilment;
  if (stops) await giveBack(tx, orderId, 'given-back');
  await rows.moveOrder(tx.sql, order, { payment, fulfilment });
  if (payment === 'refunded' && (fulfilment === 'picking' || fulfilment === 'packed')) {
    await lookAt(tx, orderId, 'Paid back in full while it was being packed. Stop the boxes.');
  }
  await record(tx, 'order.settled', {
    subject: { kind: 'order', id: orderId },
    before: { payment: order.payment, fulfilment: order.fulfilment },
    after: { payment, fulfilment },
  });
}
