import { must } from '../access';
import { type Tx } from '../record';
import { giveBack } from '../stock';
import * as rows from './rows';

/** The payment page of this try has closed unpaid: what was kept for it may be sold again. */
export async function giveBackUnpaid(tx: Tx, closed: { orderId: string; attempt: number }): Promise<void> {
  must(tx.actor, 'order.lapse');
  const order = await rows.findOrder(tx.sql, closed.orderId);
  if (!order || order.payment !== 'awaiting-payment' || order.sessionAttempt !== closed.attempt) return;
  await giveBack(tx, order.id, 'lapsed');
}
