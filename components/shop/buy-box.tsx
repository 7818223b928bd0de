'use client';

import { useState } from 'react';
import type { Action } from '@/components/forms/action-result';
import { Button } from '@/components/ui/button';
import { FieldError } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { QuantityStepper } from '@/components/ui/quantity-stepper';
import { cheaperQuantity, unitPrice } from '@/services/catalogue/rules';
import type { PriceStep } from '@/services/catalogue/schemas';
import type { VersionId } from '@/services/ids';
import { formatMoney } from '@/services/money';
import type { BasketView } from '@/services/orders/schemas';

export interface BuyBoxProps {
  name: string;
  versionId: VersionId;
  prices: readonly PriceStep[];
  ready: number;
  onPut: Action<{ versionId: VersionId; quantity: number }, BasketView>;
}

/** Price, quantity and the basket. The price follows the step that the quantity reaches. */
export function BuyBox({ name, versionId, prices, ready, onPut }: BuyBoxProps) {
  const [quantity, setQuantity] = useState(1);
  const [isSending, setSending] = useState(false);
  const [said, setSaid] = useState<{ ok: boolean; sentence: string } | null>(null);
  const unit = unitPrice(prices, quantity);
  const cheaper = cheaperQuantity(prices, quantity);

  async function put() {
    setSending(true);
    const answer = await onPut({ versionId, quantity });
    setSending(false);
    setSaid(
      answer.ok
        ? { ok: true, sentence: `In your basket: ${answer.value.count} ${answer.value.count === 1 ? 'kit' : 'kits'}.` }
        : { ok: false, sentence: answer.problem.sentence },
    );
  }

  const locked = !unit
    ? 'Not on sale yet: its price is being set.'
    : ready === 0
      ? 'None can be made just now.'
      : undefined;
  return (
    <div className="mt-4">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-3">
        {unit && (
          <p className="font-figures text-price font-semibold max-sm:basis-full">
            {formatMoney(unit)}
            {prices.length > 1 && <span className="ml-2 font-text text-caption font-normal text-ink2">each</span>}
          </p>
        )}
        {unit && (
          <QuantityStepper
            label={`Number of ${name}`}
            value={quantity}
            onChange={setQuantity}
            max={Math.max(1, Math.min(500, ready))}
          />
        )}
        <Button
          variant="primary"
          size="big"
          className="max-sm:flex-1"
          pending={isSending}
          pendingLabel="Putting it in"
          lockedReason={locked}
          reasonSide="hidden"
          onClick={put}
        >
          Put in basket
        </Button>
      </div>
      {prices.length > 1 && (
        <p className="mt-3 text-caption text-ink2">
          {prices
            .slice(1)
            .map((step) => `${formatMoney(step.unit)} each from ${step.fromQuantity}`)
            .join(', ')}
          .
        </p>
      )}
      {cheaper && (
        <p className="mt-1 text-caption font-semibold text-ochre">
          {cheaper.quantity} cost {formatMoney(cheaper.total)} in all, less than {quantity}.
        </p>
      )}
      <div aria-live="polite" className="empty:hidden">
        {said?.ok && (
          <p className="mt-3 flex flex-wrap items-center gap-3">
            <b className="text-pine">{said.sentence}</b>
            <LinkButton href="/basket" size="desk" iconAfter="arrow">
              Go to the basket
            </LinkButton>
          </p>
        )}
        {said && !said.ok && <FieldError>{said.sentence}</FieldError>}
      </div>
    </div>
  );
}
