import { must } from '../access';
import { newId } from '../ids';
import * as mail from '../mail';
import { type Money, formatMoney } from '../money';
import { type Tx, record } from '../record';
import { allocate } from '../stock';
import { numberInvoice } from './number-invoice';
import { settleRefunds } from './book-refund';
import { lookAt } from './look-at';
import * as rows from './rows';

export interface PaidSession {
  orderId: string;
  /** The provider's id of the payment: it is booked once. */
  reference: string;
  amount: Money;
}

/**
 * Books a payment that the provider reports. The order becomes paid, its stock is allocated, its invoice numbered and
 * its mail queued: each once, whatever the number and order of reports. What does not fit our own row is not booked: it
 * stands in the record and is put before a person.
 */
export async function markPaid(tx: Tx, { orderId, reference, amount }: PaidSession): Promise<void> {
  must(tx.actor, 'order.mark-paid');
  const order = await rows.findOrder(tx.sql, orderId);
  if (!order) return;
  if (amount.minor !== order.total.minor || amount.currency !== order.total.currency) {
    await lookAt(
      tx,
      orderId,
      `A payment of ${formatMoney(amount)} came in, but the order is for ${formatMoney(order.total)}. Compare ${reference} with the provider's list.`,
    );
    return;
  }
  if (!(await rows.bookMoney(tx.sql, { id: newId(), orderId, kind: 'paid', amount, reference, at: tx.now }))) return;

  if (order.payment !== 'awaiting-payment') {
    const why = order.payment === 'cancelled' ? 'after it was cancelled' : 'a second time';
    await lookAt(tx, orderId, `Paid ${why}. Refund ${formatMoney(amount)}, payment ${reference}.`);
    await record(tx, 'order.paid-again', { subject: { kind: 'order', id: orderId }, after: { reference, amount } });
    return;
  }
  const fulfilment = await allocate(tx, orderId);
  await rows.moveOrder(tx.sql, order, { payment: 'paid', fulfilment, paidAt: tx.now });
  await numberInvoice(tx, orderId);
  await mail.queue(tx, 'order-confirmed', { orderId }, orderId);
  if (fulfilment === 'backordered') await tellOfShortage(tx, orderId);
  await record(tx, 'order.paid', {
    subject: { kind: 'order', id: orderId },
    before: { payment: order.payment, fulfilment: order.fulfilment },
    after: { payment: 'paid', fulfilment, reference, amount },
  });
  await settleRefunds(tx, orderId);
}

/** The buyer by mail, the owner on the desk: paid, and the stock had gone. */
export async function tellOfShortage(tx: Tx, orderId: string): Promise<void> {
  await mail.queue(tx, 'order-backordered', { orderId }, orderId);
  await lookAt(tx, orderId, 'Paid, but the store is short of a part. Buy it in, or refund.');
}
