import type { Metadata } from 'next';
import { view } from '@/app/view';
import { PricedKitPanel } from '@/components/desk/priced-kit';
import { Empty } from '@/components/ui/empty';
import { listPriced } from '@/services/catalogue';
import { price } from '../actions';

export const metadata: Metadata = { title: 'Kits and prices' };

export default async function KitsPage() {
  const kits = await view(listPriced);
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="font-display text-page">Kits and prices</h1>
      <p className="mt-1 mb-6 max-w-measure">
        Prices include tax. The highest step that an order reaches sets the price of all its kits. Orders that were
        placed keep theirs.
      </p>
      {kits.length === 0 ? (
        <Empty title="No version is released yet">When a checker releases one, it stands here to be priced.</Empty>
      ) : (
        <div className="grid items-start gap-6 lg:grid-cols-2">
          {kits.map((kit) => (
            <PricedKitPanel key={kit.kitId} kit={kit} onSet={price} />
          ))}
        </div>
      )}
    </main>
  );
}
