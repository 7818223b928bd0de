'use client';

import { useRouter } from 'next/navigation';
import { useState, useTransition, type ReactNode } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Empty } from '@/components/ui/empty';
import { Notice } from '@/components/ui/notice';
import type { BoxCard, BoxView, ClaimBox } from '@/services/packing/schemas';
import { BoxRow } from './box-row';
import { PartPicture } from './part-picture';

export interface BoxListsProps {
  lists: { mine: BoxCard[]; free: BoxCard[]; others: BoxCard[]; closed: BoxCard[] };
  mayPack: boolean;
  onClaim: Action<ClaimBox, BoxView>;
}

/** Boxes by whose hands they are in: mine first, then the oldest that nobody has. */
export function BoxLists({ lists, mayPack, onClaim }: BoxListsProps) {
  const router = useRouter();
  const [isPending, start] = useTransition();
  const [problem, setProblem] = useState('');

  function take(card: BoxCard) {
    start(async () => {
      const answer = await onClaim({ boxId: card.id });
      if (answer.ok) router.push(`/packing/${card.id}`);
      else {
        setProblem(answer.problem.sentence);
        router.refresh();
      }
    });
  }

  const [first] = lists.free;
  const open = lists.mine.length + lists.free.length + lists.others.length;
  return (
    <>
      <div className="flex flex-wrap items-end gap-x-6 gap-y-2">
        <h1 className="font-display text-page">Boxes to pack</h1>
        <p className="pb-2">{open === 0 ? 'Everything paid for is packed.' : `${open} open, the oldest first.`}</p>
      </div>
      {problem !== '' && (
        <Notice kind="stops" size="floor" title="That box is taken" live="alert">
          {problem}
        </Notice>
      )}
      {open === 0 && (
        <Empty drawing={<PartPicture family="box" width={110} />} title="Nothing waits">
          When an order is paid and its parts are set aside, its boxes land here.
        </Empty>
      )}
      <Section title="In your hands" cards={lists.mine}>
        {(card) => (
          <BoxRow
            key={card.id}
            card={card}
            deed="Go on"
            onPress={() => router.push(`/packing/${card.id}`)}
            isPrimary
            isPending={isPending}
          />
        )}
      </Section>
      <Section title="Next" cards={lists.free}>
        {(card) => (
          <BoxRow
            key={card.id}
            card={card}
            deed={mayPack ? (card.claim?.lapsed ? 'Take it over' : 'Pack this box') : 'Look at it'}
            onPress={() => (mayPack ? take(card) : router.push(`/packing/${card.id}`))}
            isPrimary={lists.mine.length === 0 && card === first}
            isPending={isPending}
          />
        )}
      </Section>
      <Section title="With others" cards={lists.others}>
        {(card) => (
          <BoxRow
            key={card.id}
            card={card}
            deed="Look at it"
            onPress={() => router.push(`/packing/${card.id}`)}
            isPending={isPending}
          />
        )}
      </Section>
      <Section title="Closed, waiting for dispatch" cards={lists.closed}>
        {(card) => (
          <BoxRow
            key={card.id}
            card={card}
            deed="Look at it"
            onPress={() => router.push(`/packing/${card.id}`)}
            isPending={isPending}
          />
        )}
      </Section>
    </>
  );
}

function Section({
  title,
  cards,
  children,
}: {
  title: string;
  cards: readonly BoxCard[];
  children: (card: BoxCard) => ReactNode;
}) {
  if (cards.length === 0) return null;
  return (
    <section>
      <h2 className="border-b-2 border-ink pb-1 font-display text-section">{title}</h2>
      <ul>{cards.map(children)}</ul>
    </section>
  );
}
