import { Plate } from '@/components/devices/plate';
import { Button } from '@/components/ui/button';
import { Progress } from '@/components/ui/progress';
import { Tag } from '@/components/ui/tag';
import type { BoxCard } from '@/services/packing/schemas';
import { showClock, showDay, showMoment } from '@/services/time';

export interface BoxRowProps {
  card: BoxCard;
  deed: string;
  onPress: () => void;
  isPrimary?: boolean;
  isPending: boolean;
}

/** One box in a list: whose order, which version, how full, when it is due, and the one thing to do with it. */
export function BoxRow({ card, deed, onPress, isPrimary = false, isPending }: BoxRowProps) {
  const { claim } = card;
  return (
    <li className="grid items-center gap-x-6 gap-y-3 border-b border-rule py-3 md:grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)_minmax(0,1fr)_auto]">
      <div className="flex flex-wrap items-center gap-4">
        <Plate kit={card.plate.kitNumber} version={card.plate.letter} size="floor" />
        <span className="leading-6">
          <b className="block">
            <span className="font-figures">{card.orderNumber}</span>, box {card.position} of {card.of}
          </b>
          {card.plate.kitName}, {card.buyer}
        </span>
      </div>
      <div className="leading-6">
        <span className="block">Paid {showMoment(card.paidAt)}</span>
        <Due card={card} />
      </div>
      <div>
        {card.barred !== '' ? (
          <p className="font-bold text-crimson">{card.barred}</p>
        ) : (
          <Progress label={`Box ${card.serial}`} done={card.pieces.packed} of={card.pieces.needed} />
        )}
        {claim && !claim.mine && (
          <p className="text-body">
            {claim.by}, since {showClock(claim.since)}
            {claim.lapsed && '; not touched for a quarter of an hour'}
          </p>
        )}
      </div>
      <Button
        size="floor"
        variant={isPrimary ? 'primary' : 'plain'}
        pending={isPending}
        onClick={onPress}
        aria-label={`${deed}: ${card.orderNumber}, box ${card.position}`}
      >
        {deed}
      </Button>
    </li>
  );
}

function Due({ card }: { card: BoxCard }) {
  if (card.state === 'closed') return <Tag tone="pine">Closed</Tag>;
  if (card.late) return <Tag tone="crimson">Late: was due {showDay(card.dueAt)}</Tag>;
  return <span>Due {showDay(card.dueAt)}</span>;
}
