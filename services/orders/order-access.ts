import type { Knex } from 'knex';
import { type Actor, type Deed, can, must } from '../access';
import { missing } from '../problem';
import { keyFits } from './link';
import * as rows from './rows';
import type { OrderRef } from './schemas';

/**
 * The order, if this actor may do this with it. An order that is not there and one that belongs to somebody else give
 * the same answer, so that nobody learns which ids exist.
 */
export async function openOrder(sql: Knex, actor: Actor, deed: Deed, ref: OrderRef): Promise<rows.Order> {
  const order = await rows.findOrder(sql, ref.orderId);
  const owned = order && ownership(order, ref.key);
  if (!order || !owned || !can(actor, 'order.read', owned)) {
    throw missing(
      'There is no order here for you. Open the link in your e-mail, or sign in with the address you ordered with.',
    );
  }
  must(actor, deed, owned);
  return order;
}

export const ownership = (order: rows.Order, key: string | undefined) => ({
  customerId: order.customerId,
  holdsLink: keyFits(key, order.linkHash),
});
