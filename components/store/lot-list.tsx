'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Disclosure } from '@/components/ui/disclosure';
import { TextField } from '@/components/ui/field';
import { Tag } from '@/components/ui/tag';
import { sayQuantity } from '@/services/stock/rules';
import type { AcceptLot, BlockLot, LotState, StoredLot, StoredPart } from '@/services/stock/schemas';
import { showDate } from '@/services/time';

/** Null where the reader may not. */
export interface LotDeeds {
  onAccept: Action<AcceptLot, void> | null;
  /** Takes a block off again. */
  onUnblock: Action<AcceptLot, void> | null;
  onBlock: Action<BlockLot, { waiting: number }> | null;
}

const states: Record<LotState, { word: string; tone: 'pine' | 'dashed' | 'crimson' }> = {
  accepted: { word: 'Accepted', tone: 'pine' },
  quarantine: { word: 'Not inspected yet', tone: 'dashed' },
  blocked: { word: 'Blocked', tone: 'crimson' },
};

/** Lots of a part with their bins, and what may be done with each. */
export function LotList({ part, ...deeds }: { part: StoredPart } & LotDeeds) {
  const lots = part.lots.filter((lot) => lot.onHand > 0 || lot.state !== 'accepted');
  if (lots.length === 0) return <p className="mt-2 text-caption">No lot of it is in the store.</p>;
  const bins = lots.flatMap((lot) => lot.bins.map((bin) => bin.code));
  return (
    <Disclosure
      look="row"
      className="mt-1 border-b-0"
      summary={`${lots.length} ${lots.length === 1 ? 'lot' : 'lots'}${bins.length > 0 ? `, bin ${[...new Set(bins)].join(', ')}` : ''}`}
      of={`of ${part.name}`}
    >
      <ul>
        {lots.map((lot) => (
          <LotRow key={lot.id} lot={lot} part={part} {...deeds} />
        ))}
      </ul>
    </Disclosure>
  );
}

function LotRow({ lot, part, onAccept, onUnblock, onBlock }: { lot: StoredLot; part: StoredPart } & LotDeeds) {
  const [asking, setAsking] = useState<'accept' | 'block' | null>(null);
  const { word, tone } = states[lot.state];
  const accept = lot.state === 'quarantine' ? onAccept : lot.state === 'blocked' ? onUnblock : null;
  return (
    <li className="flex flex-wrap items-center gap-x-5 gap-y-2 border-t border-rule py-3">
      <div className="min-w-52 flex-1">
        <p>
          <b className="font-figures">{lot.code}</b> <Tag tone={tone}>{word}</Tag>
        </p>
        <p className="text-caption">
          {lot.supplier}, {showDate(lot.receivedAt)}
        </p>
      </div>
      <p className="min-w-44">
        {lot.bins.length === 0
          ? 'Empty'
          : lot.bins.map((bin) => `${bin.code}: ${sayQuantity(bin.onHand, part.unit)}`).join(', ')}
      </p>
      {accept && (
        <Button size="floor" onClick={() => setAsking('accept')}>
          Accept {lot.code}
        </Button>
      )}
      {onBlock && lot.state !== 'blocked' && (
        <Button size="floor" variant="danger" onClick={() => setAsking('block')}>
          Block {lot.code}
        </Button>
      )}
      {asking === 'accept' && accept && (
        <Reasoned
          title={`Accept lot ${lot.code}?`}
          body={`${sayQuantity(lot.onHand, part.unit)} of ${part.name} can then be promised and packed.`}
          label="What was looked at"
          answer={`Accept ${lot.code}`}
          onSend={(reason) => accept({ lotId: lot.id, reason })}
          onClose={() => setAsking(null)}
        />
      )}
      {asking === 'block' && onBlock && (
        <Reasoned
          title={`Block lot ${lot.code}?`}
          body={`Nobody can pick from it then. Orders that were promised its ${sayQuantity(lot.onHand, part.unit)} wait for stock again, the youngest first, and their buyers are told.`}
          label="Why nobody may use it"
          answer={`Block ${lot.code}`}
          isDanger
          onSend={(reason) => onBlock({ lotId: lot.id, reason })}
          onClose={() => setAsking(null)}
        />
      )}
    </li>
  );
}

interface ReasonedProps {
  title: string;
  body: string;
  label: string;
  answer: string;
  isDanger?: boolean;
  onSend: (reason: string) => ReturnType<Action<unknown, unknown>>;
  onClose: () => void;
}

/** A deed that needs its reason in words. */
function Reasoned({ title, body, label, answer, isDanger = false, onSend, onClose }: ReasonedProps) {
  const router = useRouter();
  const [reason, setReason] = useState('');
  const [trouble, setTrouble] = useState<string>();
  const [isPending, setPending] = useState(false);

  async function send() {
    setPending(true);
    const result = await onSend(reason);
    setPending(false);
    if (!result.ok) return setTrouble(result.problem.fields?.['reason'] ?? result.problem.sentence);
    onClose();
    router.refresh();
  }

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={title}
      answers={
        <>
          <Button variant={isDanger ? 'danger' : 'primary'} pending={isPending} onClick={send}>
            {answer}
          </Button>
          <Button onClick={onClose}>Not yet</Button>
        </>
      }
    >
      <p className="mb-4">{body}</p>
      <TextField label={label} value={reason} error={trouble} onChange={(event) => setReason(event.target.value)} />
    </Dialog>
  );
}
