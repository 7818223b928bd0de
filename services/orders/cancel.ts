import { type Tx, record } from '../record';
import { refused } from '../problem';
import { giveBack } from '../stock';
import * as rows from './rows';
import { mayCancel } from './rules';

/**
 * Step: cancels an order and gives its stock back. Money that was taken is paid back by whoever calls this. Refused
 * once a packer has begun.
 */
export async function cancel(tx: Tx, orderId: string): Promise<void> {
  const order = await rows.getOrder(tx.sql, orderId);
  if (order.fulfilment === 'cancelled') return;
  if (!mayCancel(order)) {
    throw refused(
      order.fulfilment === 'shipped'
        ? 'This order is on its way, so it cannot be cancelled. Send it back when it has come, and you get your money back.'
        : 'The packers have begun with this order, so it cannot be cancelled here. Write to the yard.',
    );
  }
  const payment = order.payment === 'awaiting-payment' ? 'cancelled' : order.payment;
  if (!(await rows.moveOrder(tx.sql, order, { payment, fulfilment: 'cancelled' }))) {
    throw refused('This order has just changed. Read it again, then decide.');
  }
  await giveBack(tx, orderId, 'given-back');
  await record(tx, 'order.cancelled', {
    subject: { kind: 'order', id: orderId },
    before: { payment: order.payment, fulfilment: order.fulfilment },
    after: { payment, fulfilment: 'cancelled' },
  });
}
