import type { Metadata } from 'next';
import { view } from '@/app/view';
import { BasketLines } from '@/components/shop/basket-lines';
import { EmptyBasket } from '@/components/shop/empty-basket';
import { readBasket } from '@/services/orders';
import { changeLine } from '../actions';
import { basketId } from '../basket-cookie';

export const metadata: Metadata = { title: 'Basket' };

export default async function BasketPage() {
  const id = await basketId();
  const basket = await view((actor) => readBasket(actor, id));
  return (
    <main id="main" className="mx-auto max-w-page px-4 py-8 sm:px-6">
      <h1 className="mb-5 font-display text-page">Basket</h1>
      {basket.lines.length === 0 ? <EmptyBasket /> : <BasketLines first={basket} onChange={changeLine} />}
    </main>
  );
}
