'use server';

import { action } from '@/app/action';
import type { Action } from '@/components/forms/action-result';
import type { CheckoutInput } from '@/components/shop/checkout-form';
import { addToBasket, changeBasket, claimOrder, placeOrder } from '@/services/orders';
import type { BasketView, ChangeBasket, OrderRef, OrderView, PlaceOrder } from '@/services/orders/schemas';
import { cancelOrder, startCheckout } from '@/services/payments';
import { currentAddress } from '@/services/people';
import { basketId, basketIdForWriting } from './basket-cookie';

type Line = Omit<ChangeBasket, 'basketId'>;

const add = action(addToBasket, { refresh: ['/basket'] });
const change = action(changeBasket, { refresh: ['/basket'] });
const place = action(async (actor, form: PlaceOrder) => placeOrder(actor, form, await currentAddress()), {
  refresh: ['/basket'],
});
const start = action(startCheckout);
const cancel = action(cancelOrder, { refresh: ['/orders/[id]', '/orders', '/desk/orders'] });
const claim = action(claimOrder, { refresh: ['/orders/[id]', '/orders'] });

/** The basket is named by the cookie, never by what the browser sends. */
export const putInBasket: Action<Line, BasketView> = async (line) =>
  add({ ...line, basketId: await basketIdForWriting() });

export const changeLine: Action<Line, BasketView> = async (line) =>
  change({ ...line, basketId: await basketIdForWriting() });

/** Makes the order and gives the address to pay at; where that does not answer, the order's own page. */
export const order: Action<CheckoutInput, { url: string }> = async (form) => {
  const placed = await place({ ...form, basketId: (await basketId()) ?? '' });
  if (!placed.ok) return placed;
  const opened = await start(placed.value);
  if (opened.ok) return opened;
  const { orderId, key } = placed.value;
  return { ok: true, value: { url: `/orders/${orderId}?key=${key}&back=unpaid` } };
};

export const pay: Action<OrderRef, { url: string }> = async (ref) => start(ref);
export const cancelIt: Action<OrderRef, OrderView> = async (ref) => cancel(ref);
export const claimIt: Action<OrderRef, { orderId: string }> = async (ref) => claim(ref);
