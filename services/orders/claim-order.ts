import { type Actor, must, personIdOf } from '../access';
import type { OrderId } from '../ids';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import { openOrder } from './order-access';
import { OrderRef } from './schemas';

/** Takes a guest's order into the account of whoever is signed in and holds its long link. */
export async function claimOrder(actor: Actor, input: OrderRef): Promise<{ orderId: OrderId }> {
  must(actor, 'order.claim');
  const ref = parse(OrderRef, input);
  const personId = personIdOf(actor);

  return write(actor, async (tx) => {
    const order = await openOrder(tx.sql, actor, 'order.pay', ref);
    if (order.customerId === personId) return { orderId: order.id };
    if (order.customerId !== null) throw refused('This order is in another account already. Sign in there to see it.');
    await tx.sql('orders').where({ id: order.id }).whereNull('customer_id').update({ customer_id: personId });
    await record(tx, 'order.claimed', {
      subject: { kind: 'order', id: order.id },
      before: { customerId: null },
      after: { customerId: personId },
    });
    return { orderId: order.id };
  });
}
