import { standing } from '@/components/shop/order-words';
import { Sign } from '@/components/ui/sign';
import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { Paging } from '@/components/ui/paging';
import { TabLinks } from '@/components/ui/tab-links';
import { Table } from '@/components/ui/table';
import { Tag } from '@/components/ui/tag';
import { formatMoney } from '@/services/money';
import type { OrderFilter, OrderPage } from '@/services/orders/schemas';
import { showMoment } from '@/services/time';

const filters: readonly { show: OrderFilter; label: string }[] = [
  { show: 'all', label: 'All orders' },
  { show: 'to-send', label: 'Paid, to be sent' },
  { show: 'look-at', label: 'To look at' },
  { show: 'unpaid', label: 'Not paid yet' },
  { show: 'sent', label: 'Sent' },
  { show: 'cancelled', label: 'Cancelled' },
];

const address = (show: OrderFilter, after?: string) => {
  const query = new URLSearchParams({
    ...(show !== 'all' && { show }),
    ...(after !== undefined && { after }),
  }).toString();
  return query === '' ? '/desk/orders' : `/desk/orders?${query}`;
};

/** All orders, newest first, by what waits. The filter and the place in the list stand in the address. */
export function OrderTable(props: { page: OrderPage; show: OrderFilter; isFirst: boolean }) {
  const { page, show, isFirst } = props;
  return (
    <>
      <TabLinks
        label="Which orders"
        look="bar"
        links={filters.map((one) => ({ href: address(one.show), label: one.label, isCurrent: one.show === show }))}
        className="mb-4"
      />
      {page.orders.length === 0 ? (
        <Empty title="No such orders">Choose another list above. New orders come in at the top of “All orders”.</Empty>
      ) : (
        <Table
          caption="Orders, newest first"
          rows={page.orders}
          rowKey={(order) => order.id}
          columns={[
            {
              key: 'number',
              head: 'Order',
              isRowHead: true,
              cell: (order) => (
                <span className="inline-flex items-center gap-2">
                  <TextLink href={`/orders/${order.id}`} className="font-figures">
                    {order.number}
                  </TextLink>
                  {order.lookAtIt && (
                    <>
                      <Sign kind="note" size={18} />
                      <span className="sr-only">Look at it: {order.lookAtIt}</span>
                    </>
                  )}
                </span>
              ),
            },
            { key: 'placed', head: 'Placed', cell: (order) => showMoment(order.placedAt) },
            { key: 'for', head: 'For', cell: (order) => order.name },
            { key: 'kits', head: 'Kits', cell: (order) => order.kits },
            {
              key: 'stands',
              head: 'Stands at',
              cell: (order) => {
                const { word, tone } = standing(order);
                return <Tag tone={tone}>{word}</Tag>;
              },
            },
            { key: 'total', head: 'In all', figures: true, cell: (order) => formatMoney(order.total) },
          ]}
        />
      )}
      <Paging
        olderHref={page.older === null ? undefined : address(show, page.older)}
        newerHref={isFirst ? undefined : address(show)}
        words={['Newest', 'Older']}
      />
    </>
  );
}
