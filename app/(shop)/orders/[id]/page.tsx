import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { view } from '@/app/view';
import { BeforeItComes } from '@/components/shop/before-it-comes';
import { OrderActions } from '@/components/shop/order-actions';
import { OrderBoxes } from '@/components/shop/order-boxes';
import { OrderNotices } from '@/components/shop/order-notices';
import { OrderSums } from '@/components/shop/order-sums';
import { OrderTimeline } from '@/components/shop/order-timeline';
import { readOrder } from '@/services/orders';
import { OrderRef } from '@/services/orders/schemas';
import { cancelIt, claimIt, pay } from '../../actions';

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

async function refOf({ params, searchParams }: Props): Promise<OrderRef> {
  const { id } = await params;
  const { key } = await searchParams;
  const asked = OrderRef.safeParse({ orderId: id, ...(typeof key === 'string' && { key }) });
  return asked.success ? asked.data : notFound();
}

/** Once a request, for the title and the page. */
const load = cache((orderId: OrderRef['orderId'], key: string | undefined) =>
  view((actor) => readOrder(actor, { orderId, ...(key !== undefined && { key }) })),
);

export async function generateMetadata(props: Props): Promise<Metadata> {
  const { orderId, key } = await refOf(props);
  const order = await load(orderId, key);
  return { title: order.number === null ? 'Your order' : `Order ${order.number}` };
}

export default async function OrderPage(props: Props) {
  const ref = await refOf(props);
  const { back } = await props.searchParams;
  const order = await load(ref.orderId, ref.key);
  const boxes = order.lines.reduce((all, line) => all + line.quantity, 0);
  const keyQuery = ref.key === undefined ? '' : `?key=${encodeURIComponent(ref.key)}`;
  return (
    <main id="main" className="mx-auto max-w-page px-4 py-8 sm:px-6">
      <OrderNotices
        order={order}
        orderKey={ref.key ?? null}
        back={back === 'paid' || back === 'unpaid' ? back : null}
      />
      <div className="mb-6 flex flex-wrap justify-between gap-x-8 gap-y-3 sm:mb-8">
        <div className="max-w-240">
          <h1 className="font-display text-page">{order.headline}</h1>
          <p className="mt-2 max-w-measure text-lead">{order.lead}</p>
        </div>
        <p className="max-sm:order-first sm:text-right">
          <span className="block">Your order</span>
          <span className="block font-figures text-price font-semibold">{order.number}</span>
          <span className="block">
            {boxes} {boxes === 1 ? 'box' : 'boxes'}
          </span>
        </p>
      </div>
      {order.fulfilment !== 'cancelled' && <OrderTimeline order={order} />}
      <div className="mt-8 grid items-start gap-x-10 gap-y-8 border-t-2 border-ink pt-6 md:grid-cols-2 lg:grid-cols-[1fr_1fr_23.75rem]">
        <OrderBoxes order={order} keyQuery={keyQuery} />
        {order.fulfilment !== 'cancelled' && <BeforeItComes order={order} />}
        <OrderActions order={order} orderRef={ref} onPay={pay} onCancel={cancelIt} onClaim={claimIt} />
      </div>
      <OrderSums order={order} />
    </main>
  );
}
