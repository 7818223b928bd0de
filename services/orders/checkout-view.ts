import { type Actor, must } from '../access';
import { formatMoney } from '../money';
import { reading } from '../record';
import { readBasket } from './basket-view';
import * as rows from './rows';
import type { BasketView } from './schemas';

export interface CheckoutView {
  basket: BasketView;
  /** Ways of sending with the countries they serve; "*" for everywhere else. */
  deliveries: { code: string; name: string; promise: string; countries: string[]; price: string; minor: number }[];
  /** What is known of a buyer who has signed in. */
  known: { email: string; name: string } | null;
}

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
