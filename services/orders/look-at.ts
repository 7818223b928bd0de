import { type Tx, record } from '../record';
import * as rows from './rows';

/** Step: puts an order before a person, with why. The same sentence a second time adds nothing. */
export async function lookAt(tx: Tx, orderId: string, sentence: string): Promise<void> {
  if (!(await rows.addToLookAt(tx.sql, orderId, sentence))) return;
  await record(tx, 'order.to-look-at', { subject: { kind: 'order', id: orderId }, reason: sentence });
}
