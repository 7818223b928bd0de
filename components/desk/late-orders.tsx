import { Panel } from '@/components/ui/panel';
import { TextLink } from '@/components/ui/link-button';
import { Table } from '@/components/ui/table';
import type { Today } from '@/services/desk/schemas';
import { showMoment } from '@/services/time';

/** How much is to be sent, and what of it should have left. */
export function ToSend({ today }: { today: Today }) {
  const { toSend, late } = today;
  return (
    <Panel
      ground="open"
      title="To send"
      note={`${toSend.orders} ${toSend.orders === 1 ? 'order' : 'orders'}, ${toSend.boxes} ${toSend.boxes === 1 ? 'box' : 'boxes'} to pack; ${toSend.unpaid} not paid yet`}
    >
      {late.length === 0 ? (
        <p>Nothing is late. An order is, when it was paid two days ago and has not left.</p>
      ) : (
        <Table
          caption="Orders that are late, oldest payment first"
          rows={late}
          rowKey={(order) => order.orderId}
          columns={[
            {
              key: 'number',
              head: 'Late order',
              isRowHead: true,
              cell: (order) => (
                <TextLink href={`/orders/${order.orderId}`} className="font-figures">
                  {order.number}
                </TextLink>
              ),
            },
            { key: 'name', head: 'For', cell: (order) => order.name },
            { key: 'paid', head: 'Paid', cell: (order) => showMoment(order.paidAt) },
            { key: 'stands', head: 'Stands at', cell: (order) => words[order.fulfilment] ?? order.fulfilment },
          ]}
        />
      )}
    </Panel>
  );
}

const words: Record<string, string> = {
  allocated: 'Set aside',
  backordered: 'Short of a part',
  picking: 'Being packed',
  packed: 'Packed',
};
