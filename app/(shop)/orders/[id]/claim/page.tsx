import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { view } from '@/app/view';
import { ClaimOrder } from '@/components/shop/claim-order';
import { Empty } from '@/components/ui/empty';
import { LinkButton, TextLink } from '@/components/ui/link-button';
import { readOrder } from '@/services/orders';
import { OrderRef } from '@/services/orders/schemas';
import { currentActor } from '@/services/people';
import { claimIt } from '../../../actions';

export const metadata: Metadata = { title: 'Keep an order in your account' };

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** Reading changes nothing: the button does, so that a mail scanner that opens the link claims no order. */
export default async function ClaimPage({ params, searchParams }: Props) {
  const { id } = await params;
  const { key } = await searchParams;
  const asked = OrderRef.safeParse({ orderId: id, ...(typeof key === 'string' && { key }) });
  if (!asked.success) notFound();
  const ref = asked.data;
  const order = await view((actor) => readOrder(actor, ref));
  const here = `/orders/${order.id}/claim?key=${ref.key ?? ''}`;
  const orderPage = `/orders/${order.id}${ref.key === undefined ? '' : `?key=${ref.key}`}`;
  if ((await currentActor()).kind === 'visitor') {
    return (
      <main id="main" className="mx-auto max-w-page px-4 py-8 sm:px-6">
        <h1 className="mb-5 font-display text-page">Order {order.number}</h1>
        <Empty title="Sign in, and keep this order in your account">
          <LinkButton href={`/sign-in?next=${encodeURIComponent(here)}`}>Sign in</LinkButton>
        </Empty>
      </main>
    );
  }
  if (!order.may.claim) redirect(orderPage);
  return (
    <main id="main" className="mx-auto max-w-page px-4 py-8 sm:px-6">
      <h1 className="mb-2 font-display text-page">Order {order.number}</h1>
      <p className="mb-5 max-w-measure text-lead">
        Keep it in your account and you find it under <TextLink href="/orders">My orders</TextLink>, without the link.
      </p>
      <ClaimOrder orderRef={ref} onClaim={claimIt} done={orderPage} />
    </main>
  );
}
