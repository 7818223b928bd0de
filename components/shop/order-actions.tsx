'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action, ActionResult } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { formatMoney } from '@/services/money';
import type { OrderRef, OrderView } from '@/services/orders/schemas';

export interface OrderActionsProps {
  order: OrderView;
  orderRef: OrderRef;
  onPay: Action<OrderRef, { url: string }>;
  onCancel: Action<OrderRef, OrderView>;
  onClaim: Action<OrderRef, { orderId: string }>;
}

/** What the buyer may do with the order now. */
export function OrderActions({ order, orderRef, onPay, onCancel, onClaim }: OrderActionsProps) {
  const router = useRouter();
  const [isAsking, setAsking] = useState(false);
  const [pending, setPending] = useState<'pay' | 'cancel' | 'claim' | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const isPaid = order.payment !== 'awaiting-payment';

  async function run<V>(what: 'pay' | 'cancel' | 'claim', deed: Action<OrderRef, V>, done: (value: V) => void) {
    setPending(what);
    setTrouble(null);
    const answer: ActionResult<V> = await deed(orderRef);
    setPending(null);
    setAsking(false);
    if (answer.ok) done(answer.value);
    else setTrouble(answer.problem.sentence);
  }

  return (
    <Panel ground="plate" title={order.may.pay ? 'Pay for it' : 'Your papers'}>
      {order.may.pay ? (
        <p className="mb-4">
          You pay by card on our payment provider’s page. Nothing is sent before the money is here.
        </p>
      ) : (
        <p className="mb-4">{papersWords(order)}</p>
      )}
      <div className="grid gap-3">
        {order.may.pay && (
          <Button
            variant="cream"
            size="big"
            pending={pending === 'pay'}
            pendingLabel="Opening the payment page"
            onClick={() => run('pay', onPay, ({ url }) => window.location.assign(url))}
          >
            Pay {formatMoney(order.total)}
          </Button>
        )}
        {order.invoice && (
          <LinkButton
            variant="cream"
            icon="sheet"
            prefetch={false}
            href={`/papers/invoice/${order.invoice.id}${keyQuery(orderRef)}`}
          >
            Invoice {order.invoice.number}
          </LinkButton>
        )}
        {order.may.claim && (
          <Button
            variant="outline"
            pending={pending === 'claim'}
            onClick={() => run('claim', onClaim, () => router.refresh())}
          >
            Keep it in my account
          </Button>
        )}
        {order.may.cancel && (
          <Button variant="outline" onClick={() => setAsking(true)}>
            Cancel the order
          </Button>
        )}
      </div>
      <p role="status" className="mt-3 font-semibold empty:hidden">
        {trouble}
      </p>
      {order.may.cancel && (
        <p className="mt-3 text-caption text-on-enamel2">It can be cancelled until a packer begins with it.</p>
      )}
      <Dialog
        isOpen={isAsking}
        onClose={() => setAsking(false)}
        title={`Cancel order ${order.number}?`}
        answers={
          <>
            <Button
              variant="danger"
              pending={pending === 'cancel'}
              pendingLabel="Cancelling it"
              onClick={() => run('cancel', onCancel, () => router.refresh())}
            >
              Cancel {order.number}
            </Button>
            <Button onClick={() => setAsking(false)}>Keep it</Button>
          </>
        }
      >
        {isPaid
          ? `${formatMoney(order.paid)} goes back to the card it came from. Banks take up to ten days to show it.`
          : 'Nothing was taken. The kits that we set aside for you can be bought by others again.'}
      </Dialog>
    </Panel>
  );
}

const keyQuery = ({ key }: OrderRef) => (key === undefined ? '' : `?key=${encodeURIComponent(key)}`);

function papersWords(order: OrderView): string {
  if (!order.invoice) return 'There is no invoice for this order.';
  return order.fulfilment === 'cancelled'
    ? 'The invoice stays yours to read; what was paid back is listed below.'
    : 'Keep the invoice; each guide belongs to its own box.';
}
