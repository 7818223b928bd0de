import { Disclosure } from '@/components/ui/disclosure';
import { TextLink } from '@/components/ui/link-button';
import { Tag } from '@/components/ui/tag';
import type { OrderBox, OrderView } from '@/services/orders/schemas';
import { sayQuantity } from '@/services/stock/rules';
import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import { kHz } from './words';

const states: Record<OrderBox['state'], string> = {
  'to-pack': 'Waits for a packer',
  packing: 'Being packed',
  closed: 'Closed',
  shipped: 'Sent',
};

/** The kits of the order and, once the packers have made them, its boxes with what goes into each. */
export function OrderBoxes({ order, keyQuery }: { order: OrderView; keyQuery: string }) {
  return (
    <section aria-labelledby="in-each-box">
      <h2 id="in-each-box" className="mb-2 font-display text-section">
        {order.boxes.length > 0 ? 'In each box' : 'Your kits'}
      </h2>
      <ul>
        {order.lines.map((line) => (
          <li key={line.versionId} className="flex items-center gap-4 border-t border-rule py-2.5">
            <SvgDrawing drawing={partDrawing('box')} width={50} className="shrink-0" />
            <div className="min-w-0">
              <b className="block">
                {line.quantity} {line.name}, No. {line.number}, version {line.number}&#8239;{line.letter}
              </b>
              {line.set && (
                <span className="text-caption text-ink2">
                  Tunes {kHz(line.set.tunes.lo)} to {kHz(line.set.tunes.hi)} kHz
                </span>
              )}
            </div>
          </li>
        ))}
      </ul>
      <ul className="border-t border-rule empty:hidden">
        {order.boxes.map((box) => (
          <li key={box.id}>
            <Disclosure
              look="row"
              summary={
                <span className="flex flex-wrap items-center gap-x-3 gap-y-1">
                  <span className="font-figures">{box.serial}</span>
                  <Tag tone={box.state === 'to-pack' ? 'dashed' : box.state === 'packing' ? 'enamel' : 'pine'}>
                    {states[box.state]}
                  </Tag>
                </span>
              }
            >
              <Contents box={box} />
              {(box.state === 'closed' || box.state === 'shipped') && (
                <p className="mt-2">
                  <TextLink href={`/papers/guide/${box.id}${keyQuery}`} prefetch={false} bold>
                    The guide of this box
                  </TextLink>
                </p>
              )}
            </Disclosure>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Contents({ box }: { box: OrderBox }) {
  return (
    <ul className="grid gap-1 text-table">
      {box.contents.map((item) => (
        <li key={item.reference} className="flex gap-3">
          <span className="w-8 shrink-0 font-figures text-ink2">{item.reference}</span>
          <span className="flex-1">{item.name}</span>
          <span className="font-figures">{sayQuantity(item.quantity, item.unit)}</span>
        </li>
      ))}
    </ul>
  );
}
