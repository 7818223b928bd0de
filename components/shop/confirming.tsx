'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { LinkButton } from '@/components/ui/link-button';
import { hasBeenPaid } from './order-state';

const everyMs = 1500;
/** After this many looks the buyer is told that it takes longer than it should. */
const patience = 20;

/** Shown after the payment page: our own row says when it is paid, nothing else does. */
export function Confirming({ orderId, orderKey }: { orderId: string; orderKey: string | null }) {
  const router = useRouter();
  const [looks, setLooks] = useState(0);

  useEffect(() => {
    const timer = setTimeout(() => {
      void hasBeenPaid(orderId, orderKey).then((isPaid) => {
        if (isPaid) router.refresh();
        setLooks((count) => count + 1);
      });
    }, everyMs);
    return () => clearTimeout(timer);
  }, [looks, orderId, orderKey, router]);

  const query = orderKey === null ? '' : `?key=${orderKey}`;
  return (
    <Notice
      kind="info"
      live="status"
      title="Your payment is being confirmed"
      actions={
        looks > patience && (
          <LinkButton href={`/orders/${orderId}${query}`} prefetch={false}>
            Look again
          </LinkButton>
        )
      }
    >
      {looks <= patience
        ? 'The bank tells us in a moment; this page follows by itself.'
        : 'It takes longer than it should. You need not pay again: we look it up every few minutes, and a mail tells you.'}
    </Notice>
  );
}
