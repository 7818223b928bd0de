import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { showClock, showMoment } from '@/services/time';
import type { BoxView } from '@/services/packing/schemas';

export interface HandsPanelProps {
  box: BoxView;
  mayPack: boolean;
  isBusy: boolean;
  onClaim: () => void;
}

/** Shown while the box is not in the reader's hands: why, and what can be done about it. */
export function HandsPanel({ box, mayPack, isBusy, onClaim }: HandsPanelProps) {
  if (box.closedAt !== null) {
    return (
      <>
        <h2 className="font-display text-[30px] leading-9">The box is closed</h2>
        <p className="text-on-enamel2">Closed {showMoment(box.closedAt)}. What is in it stays on record.</p>
        <div className="mt-auto grid gap-3">
          <LinkButton href={`/packing/trace/${box.serial}`} variant="outline" size="floor">
            Read its trace
          </LinkButton>
          <LinkButton
            href={`/papers/label/${box.id}`}
            target="_blank"
            prefetch={false}
            variant="outline"
            size="floor"
            icon="print"
          >
            Print the box label
          </LinkButton>
          <LinkButton href="/packing" variant="cream" size="floor">
            Take the next box
          </LinkButton>
        </div>
      </>
    );
  }
  const { claim } = box;
  const isFree = claim === null || claim.lapsed || claim.mine;
  return (
    <>
      <h2 className="font-display text-[30px] leading-9">
        {isFree ? 'Nobody has this box' : `${claim.by} has this box`}
      </h2>
      <p className="text-on-enamel2">
        {claim === null
          ? 'Take it, and the tray leads you from bin to bin.'
          : claim.lapsed
            ? `${claim.by} has not touched it since ${showClock(claim.since)}. Take it over; what is in it stays in.`
            : `Since ${showClock(claim.since)}. It is free again fifteen minutes after the last scan.`}
      </p>
      {box.reasons[0]?.startsWith('Version') && <p className="font-bold">{box.reasons[0]}</p>}
      <div className="mt-auto grid gap-3">
        {isFree && mayPack && (
          <Button variant="cream" size="floor" pending={isBusy} onClick={onClaim}>
            Pack this box
          </Button>
        )}
        <LinkButton href="/packing" variant="outline" size="floor">
          All boxes
        </LinkButton>
      </div>
    </>
  );
}
