import type { Action } from '@/components/forms/action-result';
import { Plate } from '@/components/devices/plate';
import { WindingMark } from '@/components/devices/winding-mark';
import { Facts } from '@/components/ui/figure-text';
import type { PricedKit, SetPrice } from '@/services/catalogue/schemas';
import { formatMoney } from '@/services/money';
import { PriceForm } from './price-form';

/** A kit on sale: what one costs in parts, how many can be made, and its price. */
export function PricedKitPanel({ kit, onSet }: { kit: PricedKit; onSet: Action<SetPrice, void> }) {
  return (
    <section id={kit.code} aria-label={kit.name} className="scroll-mt-4 rounded-panel border border-rule bg-card p-5">
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Plate kit={kit.number} version={kit.letter} size="row" />
        <h2 className="font-display text-panel">{kit.name}</h2>
        <WindingMark state={kit.state} className="ml-auto" />
      </div>
      <Facts
        className="mb-4"
        facts={[
          { term: 'Parts of one box', value: <span className="font-figures">{formatMoney(kit.cost)}</span> },
          {
            term: 'Can be made now',
            value: kit.limitedBy === null ? `${kit.ready}` : `${kit.ready}, then ${kit.limitedBy} runs out`,
          },
        ]}
      />
      <PriceForm kit={kit} onSet={onSet} />
    </section>
  );
}
