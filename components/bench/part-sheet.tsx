import { Facts } from '@/components/ui/figure-text';
import { Panel } from '@/components/ui/panel';
import { Tag } from '@/components/ui/tag';
import { formatMoney } from '@/services/money';
import { type PartView, partKinds } from '@/services/parts/schemas';
import { grouped, showQuantity } from '@/services/quantity';
import { PartPicture } from './part-picture';
import { partWords } from './part-words';

/** A part at a glance: drawing, value, what it costs and what the store holds. */
export function PartSheet({ part }: { part: PartView }) {
  const { value, unit, tolerance, detail } = partWords(part.values);
  const amount = (quantity: number) =>
    part.unit === 'each' ? grouped(quantity) : showQuantity(quantity / 1000, part.unit === 'metre' ? 'm' : 'g', 6);
  return (
    <Panel ground="open" title="At a glance">
      <div className="flex flex-wrap items-center gap-4">
        <PartPicture values={part.values} width={96} />
        <div>
          {part.retired && <Tag tone="dashed">Retired</Tag>}
          {value !== undefined && (
            <p>
              <span className="font-figures text-price font-semibold">{value}</span> {unit}
            </p>
          )}
          <p className="text-caption text-ink2">
            {[tolerance !== null && `±${tolerance} %`, detail].filter((one) => one).join(', ')}
          </p>
        </div>
      </div>
      <Facts
        className="mt-4"
        facts={[
          { term: 'Kind', value: partKinds[part.values.kind].label },
          { term: 'Cost', value: `${formatMoney(part.cost)} a ${part.unit === 'each' ? 'piece' : part.unit}` },
          { term: 'On hand', value: amount(part.stock.onHand) },
          { term: 'Available', value: amount(part.stock.available) },
          ...(part.note === '' ? [] : [{ term: 'Note', value: part.note }]),
        ]}
      />
    </Panel>
  );
}
