import { ReachRail } from '@/components/charts/reach-rail';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { TextLink } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { Table } from '@/components/ui/table';
import type { Today } from '@/services/desk/schemas';
import { formatMoney } from '@/services/money';

/** The kits on sale, with what each earns at its price for one. */
export function OnSaleTable({ kits }: { kits: Today['onSale'] }) {
  return (
    <Panel
      ground="open"
      title="On sale"
      note="reach at worst case against the band; sold in seven days"
      aside={
        <TextLink href="/desk/kits" bold>
          Set prices
        </TextLink>
      }
    >
      <Table
        caption="Kits with a released version"
        rows={kits}
        rowKey={(kit) => kit.kitId}
        empty="No version is released yet. When a checker releases one, it stands here to be priced."
        columns={[
          {
            key: 'kit',
            head: 'Kit',
            isRowHead: true,
            cell: (kit) => (
              <span className="flex items-center gap-3">
                <Plate kit={kit.number} size="row" />
                <span>
                  {kit.name}{' '}
                  <span className="font-figures font-normal text-ink2">
                    {kit.number}&#8239;{kit.letter}
                  </span>
                </span>
              </span>
            ),
          },
          { key: 'state', head: 'State', cell: (kit) => <WindingMark state={kit.state} /> },
          {
            key: 'reach',
            head: 'Reach',
            cell: (kit) => (kit.reach ? <ReachRail {...kit.reach} size="list" className="w-41" /> : null),
          },
          { key: 'sold', head: 'Sold', figures: true, cell: (kit) => kit.sold },
          { key: 'ready', head: 'Ready', figures: true, cell: (kit) => kit.ready },
          { key: 'cost', head: 'Parts cost', figures: true, cell: (kit) => formatMoney(kit.cost) },
          {
            key: 'price',
            head: 'Price',
            figures: true,
            cell: (kit) => (kit.prices[0] ? formatMoney(kit.prices[0].unit) : 'none'),
          },
        ]}
      />
    </Panel>
  );
}
