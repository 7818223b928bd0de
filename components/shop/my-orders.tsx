import { Empty } from '@/components/ui/empty';
import { TextLink } from '@/components/ui/link-button';
import { Paging } from '@/components/ui/paging';
import { Table } from '@/components/ui/table';
import { Tag } from '@/components/ui/tag';
import { formatMoney } from '@/services/money';
import type { OrderPage } from '@/services/orders/schemas';
import { showDate } from '@/services/time';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import { standing } from './order-words';

export function MyOrders({ page, isFirst }: { page: OrderPage; isFirst: boolean }) {
  if (page.orders.length === 0) {
    return (
      <Empty title="No orders yet" drawing={<SvgDrawing drawing={partDrawing('box')} width={100} />}>
        What you order while signed in stands here. A guest order joins it through the link in its mail.
      </Empty>
    );
  }
  return (
    <>
      <Table
        caption="Your orders, newest first"
        rows={page.orders}
        rowKey={(order) => order.id}
        columns={[
          {
            key: 'number',
            head: 'Order',
            isRowHead: true,
            cell: (order) => (
              <TextLink href={`/orders/${order.id}`} className="font-figures">
                {order.number}
              </TextLink>
            ),
          },
          { key: 'placed', head: 'Placed', cell: (order) => showDate(order.placedAt) },
          { key: 'kits', head: 'Kits', cell: (order) => order.kits },
          {
            key: 'state',
            head: 'Stands at',
            cell: (order) => {
              const { word, tone } = standing(order);
              return <Tag tone={tone}>{word}</Tag>;
            },
          },
          { key: 'total', head: 'In all', figures: true, cell: (order) => formatMoney(order.total) },
        ]}
      />
      <Paging
        olderHref={page.older === null ? undefined : `/orders?after=${page.older}`}
        newerHref={isFirst ? undefined : '/orders'}
        words={['Newest', 'Older']}
      />
    </>
  );
}
