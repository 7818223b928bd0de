import type { ReactNode } from 'react';
import { formatMoney } from '@/services/money';
import type { BasketView } from '@/services/orders/schemas';

interface CheckoutSumProps {
  basket: BasketView;
  method: { name: string; price: string } | undefined;
  total: string;
  children: ReactNode;
}

/** What is being paid for, line by line, beside the form. */
export function CheckoutSum({ basket, method, total, children }: CheckoutSumProps) {
  return (
    <section aria-labelledby="sum" className="rounded-panel border border-rule bg-card p-5 md:sticky md:top-6">
      <h2 id="sum" className="mb-3 font-display text-panel">
        Your order
      </h2>
      <dl className="grid grid-cols-[1fr_auto] gap-y-2">
        {basket.lines.map((line) => (
          <div key={line.versionId} className="contents">
            <dt>
              {line.quantity} {line.name}, No. {line.number}&#8239;{line.letter}
            </dt>
            <dd className="pl-4 text-right font-figures font-semibold">{line.total && formatMoney(line.total)}</dd>
          </div>
        ))}
        {method && (
          <div className="contents">
            <dt>{method.name}</dt>
            <dd className="pl-4 text-right font-figures font-semibold">{method.price}</dd>
          </div>
        )}
        <div className="contents">
          <dt className="border-t-1.5 border-ink pt-2 font-bold">In all, tax included</dt>
          <dd
            aria-live="polite"
            className="border-t-1.5 border-ink pt-2 pl-4 text-right font-figures text-value font-semibold"
          >
            {total}
          </dd>
        </div>
      </dl>
      <div className="mt-5">{children}</div>
    </section>
  );
}
