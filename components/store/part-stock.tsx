import { FigureText } from '@/components/ui/figure-text';
import { showQuantity } from '@/services/stock/rules';
import type { StoredPart } from '@/services/stock/schemas';
import { PartPicture } from '@/components/packing/part-picture';
import type { PartUnit } from '@/services/parts/schemas';
import { LotList, type LotDeeds } from './lot-list';

/** One part of the store: how much there is, how much of it is promised, and in which bins it lies. */
export function PartStock({ part, ...deeds }: { part: StoredPart } & LotDeeds) {
  const { unit } = part;
  const promised = part.reserved + part.allocated;
  const waiting = part.onHand - part.accepted;
  return (
    <li className="border-b border-rule py-4">
      <div className="grid items-center gap-x-6 gap-y-3 md:grid-cols-[minmax(0,1fr)_auto]">
        <div className="flex min-w-0 items-center gap-4">
          <PartPicture family={part.silhouette} width={70} className="shrink-0" />
          <div className="min-w-0">
            <h2 className="font-bold">{part.name}</h2>
            <p className="font-figures text-ink2">{part.code}</p>
          </div>
        </div>
        <dl className="grid grid-cols-2 gap-x-6 gap-y-1 sm:grid-cols-4">
          <Figure term="On hand" quantity={part.onHand} unit={unit} />
          <Figure term="Promised" quantity={promised} unit={unit} />
          <Figure term="Available" quantity={part.available} unit={unit} isMain />
          <Figure term="Not usable" quantity={waiting} unit={unit} />
        </dl>
      </div>
      <LotList part={part} {...deeds} />
    </li>
  );
}

function Figure(props: { term: string; quantity: number; unit: PartUnit; isMain?: boolean }) {
  const { term, quantity, unit, isMain = false } = props;
  const shown = showQuantity(quantity, unit);
  return (
    <div className="min-w-28 sm:text-right">
      <dt className="text-caption">{term}</dt>
      <dd className={isMain ? 'text-panel' : undefined}>
        <FigureText
          value={shown.figure}
          unit={unit === 'each' ? undefined : shown.unit}
          bold={isMain || quantity > 0}
        />
      </dd>
    </div>
  );
}
