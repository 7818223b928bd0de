import { type Actor, must } from '../access';
import { formatMoney } from '../money';
import { reading } from '../record';
import { readBasket } from './basket-view';
import * as rows from './rows';
import type { CheckoutView } from './schemas';

/** What the checkout form shows: the basket, the ways of sending, and who is asking. */
export async function readCheckout(actor: Actor, basketId: string | null): Promise<CheckoutView> {
  must(actor, 'order.place');
  const deliveries = await rows.deliveries(reading());
  return {
    basket: await readBasket(actor, basketId),
    deliveries: deliveries.map(({ price, ...method }) => ({
      ...method,
      price: formatMoney(price),
      minor: price.minor,
    })),
    known: 'email' in actor ? { email: actor.email, name: actor.name } : null,
  };
}
