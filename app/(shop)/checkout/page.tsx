import type { Metadata } from 'next';
import { view } from '@/app/view';
import { CheckoutForm } from '@/components/shop/checkout-form';
import { EmptyBasket } from '@/components/shop/empty-basket';
import { Breadcrumbs } from '@/components/ui/breadcrumbs';
import { Empty } from '@/components/ui/empty';
import { countriesServed } from '@/services/countries';
import { readCheckout } from '@/services/orders';
import { order } from '../actions';
import { basketId } from '../basket-cookie';

export const metadata: Metadata = { title: 'Checkout' };

export default async function CheckoutPage() {
  const id = await basketId();
  const checkout = await view((actor) => readCheckout(actor, id));
  return (
    <main id="main" className="mx-auto max-w-page px-4 pb-8 sm:px-6">
      <Breadcrumbs
        trail={[
          { href: '/', label: 'Kits' },
          { href: '/basket', label: 'Basket' },
        ]}
        here="Checkout"
      />
      <h1 className="mb-5 font-display text-page">Checkout</h1>
      {checkout.basket.lines.length === 0 ? (
        <EmptyBasket />
      ) : checkout.deliveries.length === 0 ? (
        <Empty title="Nothing can be sent just now">
          The yard has not said yet how parcels go out. Your basket is kept; come back tomorrow.
        </Empty>
      ) : (
        <CheckoutForm
          checkout={checkout}
          countries={countriesServed(checkout.deliveries.flatMap((method) => method.countries))}
          onOrder={order}
        />
      )}
    </main>
  );
}
