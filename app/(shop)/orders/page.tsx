import type { Metadata } from 'next';
import { view } from '@/app/view';
import { MyOrders } from '@/components/shop/my-orders';
import { listMyOrders } from '@/services/orders';

export const metadata: Metadata = { title: 'My orders' };

type Search = Promise<Record<string, string | string[] | undefined>>;

export default async function MyOrdersPage({ searchParams }: { searchParams: Search }) {
  const { after } = await searchParams;
  const from = typeof after === 'string' ? { after } : {};
  const page = await view((actor) => listMyOrders(actor, from));
  return (
    <main id="main" className="mx-auto max-w-page px-4 py-8 sm:px-6">
      <h1 className="mb-5 font-display text-page">My orders</h1>
      <MyOrders page={page} isFirst={from.after === undefined} />
    </main>
  );
}
