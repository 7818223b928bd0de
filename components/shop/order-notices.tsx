import { Notice } from '@/components/ui/notice';
import type { OrderView } from '@/services/orders/schemas';
import { showClock } from '@/services/time';
import { Confirming } from './confirming';

interface OrderNoticesProps {
  order: OrderView;
  orderKey: string | null;
  /** Which way the buyer came back from the payment page, as the address says; it changes nothing but the words. */
  back: 'paid' | 'unpaid' | null;
}

/** What has to be said before all else. */
export function OrderNotices({ order, orderKey, back }: OrderNoticesProps) {
  const isWaiting = order.payment === 'awaiting-payment';
  return (
    <div className="mb-6 grid gap-3 empty:hidden">
      {order.lookAtIt && (
        <Notice kind="note" title="Look at this order">
          {order.lookAtIt}
        </Notice>
      )}
      {isWaiting && back === 'paid' && <Confirming orderId={order.id} orderKey={orderKey} />}
      {isWaiting && back !== 'paid' && order.bankSaidNo && (
        <Notice kind="stops" title="Your bank said no">
          Nothing was taken and your order is kept. Try another card.
        </Notice>
      )}
      {isWaiting && back !== 'paid' && !order.bankSaidNo && order.keptUntil !== null && (
        <Notice kind="info" title={`Your kits are set aside until ${showClock(order.keptUntil)}`}>
          Pay by then and they are yours. Later we set them aside again, if there are any left.
        </Notice>
      )}
      {isWaiting && back !== 'paid' && order.keptUntil === null && (
        <Notice kind="note" title="Your kits are no longer set aside">
          The time to pay has run out, and nothing was taken. Pay now, and we set them aside again if there are any
          left.
        </Notice>
      )}
    </div>
  );
}
