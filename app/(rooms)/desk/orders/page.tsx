import type { Metadata } from 'next';
import { view } from '@/app/view';
import { OrderTable } from '@/components/desk/order-table';
import { listOrders } from '@/services/orders';
import { ListOrders } from '@/services/orders/schemas';

export const metadata: Metadata = { title: 'Orders' };

type Search = Promise<Record<string, string | string[] | undefined>>;

export default async function OrdersPage({ searchParams }: { searchParams: Search }) {
  const { show, after } = await searchParams;
  const asked = ListOrders.safeParse({ show, after });
  const list = asked.success ? asked.data : ListOrders.parse({});
  const page = await view((actor) => listOrders(actor, list));
  return (
    <main id="main" className="mx-auto max-w-desk px-4 py-6 sm:px-6">
      <h1 className="mb-4 font-display text-page">Orders</h1>
      <OrderTable page={page} show={list.show} isFirst={list.after === undefined} />
    </main>
  );
}
