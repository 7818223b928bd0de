'use client';

import Link from 'next/link';
import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Plate } from '@/components/devices/plate';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { QuantityStepper } from '@/components/ui/quantity-stepper';
import { formatMoney } from '@/services/money';
import type { BasketLine, BasketView, ChangeBasket } from '@/services/orders/schemas';
import { EmptyBasket } from './empty-basket';

type ChangeLine = Action<Omit<ChangeBasket, 'basketId'>, BasketView>;

/** The basket: each kit with its number, what it costs, and what stands in its way. */
export function BasketLines({ first, onChange }: { first: BasketView; onChange: ChangeLine }) {
  const [basket, setBasket] = useState(first);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [waiting, setWaiting] = useState<string | null>(null);

  async function change(line: BasketLine, quantity: number) {
    setWaiting(line.versionId);
    const answer = await onChange({ versionId: line.versionId, quantity });
    setWaiting(null);
    setTrouble(answer.ok ? null : answer.problem.sentence);
    if (answer.ok) setBasket(answer.value);
  }

  if (basket.lines.length === 0) return <EmptyBasket />;
  const blocked = basket.lines.some((line) => line.trouble !== null);
  return (
    <div className="grid items-start gap-x-11 gap-y-6 md:grid-cols-[minmax(0,1fr)_minmax(0,22rem)]">
      <ul aria-label="Kits in your basket" className="border-t-2 border-ink">
        {basket.lines.map((line) => (
          <Line key={line.versionId} line={line} isWaiting={waiting === line.versionId} onChange={change} />
        ))}
      </ul>
      <section aria-label="Sum" className="rounded-panel border border-rule bg-card p-5">
        <p className="flex items-baseline justify-between gap-4">
          <span className="font-bold">
            {basket.count} {basket.count === 1 ? 'kit' : 'kits'}
          </span>
          <span aria-live="polite" className="font-figures text-price font-semibold">
            {formatMoney(basket.total)}
          </span>
        </p>
        <p className="mt-1 mb-4 text-caption text-ink2">
          Prices include tax. Delivery is added next, by where it goes.
        </p>
        {blocked ? (
          <Button
            variant="primary"
            size="big"
            className="w-full"
            lockedReason="See to the kits marked above first."
            reasonSide="below"
          >
            Go to checkout
          </Button>
        ) : (
          <LinkButton href="/checkout" variant="primary" size="big" className="w-full" iconAfter="arrow">
            Go to checkout
          </LinkButton>
        )}
        {trouble && <FieldError>{trouble}</FieldError>}
      </section>
    </div>
  );
}

interface LineProps {
  line: BasketLine;
  isWaiting: boolean;
  onChange: (line: BasketLine, quantity: number) => Promise<void>;
}

function Line({ line, isWaiting, onChange }: LineProps) {
  const { name, number, letter, quantity } = line;
  return (
    <li aria-busy={isWaiting} className="border-b border-rule py-4">
      <div className="flex flex-wrap items-center gap-x-5 gap-y-3">
        <Plate kit={number} version={letter} size="row" />
        <div className="min-w-40 flex-1">
          <Link href={`/kits/${line.code}`} className="link font-bold">
            {name}
          </Link>
          <p className="text-caption text-ink2">{line.unit ? `${formatMoney(line.unit)} each` : 'No price'}</p>
        </div>
        <QuantityStepper
          size="desk"
          label={`Number of ${name}`}
          value={quantity}
          max={500}
          onChange={(next) => void onChange(line, next)}
        />
        <p className="w-24 text-right font-figures text-value font-semibold">
          {line.total ? formatMoney(line.total) : ''}
        </p>
        <Button variant="quiet" onClick={() => void onChange(line, 0)}>
          Take out<span className="sr-only"> {name}</span>
        </Button>
      </div>
      {line.trouble && <Notice kind="note" title={line.trouble} live="status" className="mt-3" level={3} />}
      {line.cheaper && (
        <p className="mt-2 text-caption font-semibold text-ochre">
          {line.cheaper.quantity} cost {formatMoney(line.cheaper.total)} in all, less than {quantity}.
        </p>
      )}
    </li>
  );
}
