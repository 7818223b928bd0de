'use client'; // Drawn whole: parts of a server-drawn picture that stream in later come in an inline style, which the CSP drops.

import { Empty } from '@/components/ui/empty';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import type { PickList, PickStop } from '@/services/packing/schemas';
import { PartPicture } from './part-picture';

const walks = [1, 5, 10, 20];

/** One walk along the bins: at each stop what to take, of which lot, and which boxes it is for. */
export function PickListView({ list }: { list: PickList }) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3">
        <h1 className="font-display text-page">Pick list</h1>
        <p className="pb-2">
          {list.boxes.length === 0
            ? 'No box waits.'
            : `${list.stops.length} bins for ${list.boxes.length === 1 ? 'one box' : `${list.boxes.length} boxes`}${list.more > 0 ? `; ${list.more} more wait` : ''}.`}
        </p>
        <nav aria-label="How many boxes" className="flex flex-wrap gap-3 sm:ml-auto">
          {walks.map((count) => (
            <LinkButton
              key={count}
              href={`/packing/pick-list?boxes=${count}`}
              size="floor"
              variant={count === list.asked ? 'primary' : 'plain'}
              aria-current={count === list.asked ? 'true' : undefined}
            >
              {count === 1 ? 'One box' : `${count} boxes`}
            </LinkButton>
          ))}
        </nav>
      </div>
      {list.short.length > 0 && (
        <Notice kind="note" size="floor" title="Not in any bin">
          {list.short.map((part) => `${part.name} (${part.partCode}): ${part.amount}`).join('; ')}. Tell the owner
          before you start.
        </Notice>
      )}
      {list.boxes.length === 0 ? (
        <Empty drawing={<PartPicture family="box" width={110} />} title="Nothing to fetch">
          The walk appears here as soon as an order is paid.
        </Empty>
      ) : (
        <ol className="border-t-2 border-ink">
          {list.stops.map((stop) => (
            <Stop key={stop.binCode} stop={stop} />
          ))}
        </ol>
      )}
    </div>
  );
}

function Stop({ stop }: { stop: PickStop }) {
  return (
    <li className="grid gap-x-6 gap-y-2 border-b border-rule py-4 md:grid-cols-[9rem_1fr]">
      <h2 className="font-display text-[44px] leading-[48px]">
        <span className="sr-only">Bin </span>
        {stop.binCode}
      </h2>
      <ul className="grid gap-3">
        {stop.items.map((item) => (
          <li
            key={item.lotCode}
            className="grid grid-cols-[72px_minmax(0,1fr)] items-center gap-x-5 gap-y-1 sm:grid-cols-[72px_minmax(0,1fr)_11rem_minmax(0,1.2fr)]"
          >
            <PartPicture family={item.family} width={72} />
            <span className="leading-6">
              <b className="block text-[20px]">{item.name}</b>
              <span className="font-figures">{item.partCode}</span>, lot <b className="font-figures">{item.lotCode}</b>
            </span>
            <b className="font-figures text-[26px] leading-8 max-sm:col-start-2">
              {item.amount.split(', ').map((part) => (
                <span key={part} className="block whitespace-nowrap">
                  {part}
                </span>
              ))}
            </b>
            <span className="text-body max-sm:col-start-2">
              {item.boxes.map((box) => `${box.amount} for ${box.orderNumber} box ${box.position}`).join(', ')}
            </span>
          </li>
        ))}
      </ul>
    </li>
  );
}
