import { formatMoney } from '@/services/money';
import { countryName } from '@/services/countries';
import type { OrderView } from '@/services/orders/schemas';

/** What it costs and where it goes. */
export function OrderSums({ order }: { order: OrderView }) {
  const { address } = order;
  const rows = [
    ...order.lines.map((line) => ({
      term: `${line.quantity} ${line.name}, ${formatMoney(line.unit)} each`,
      value: formatMoney(line.total),
    })),
    { term: order.delivery.name, value: formatMoney(order.deliveryPrice) },
  ];
  const lines = [
    order.name,
    address.line1,
    address.line2,
    [address.town, address.postcode].filter(Boolean).join(' '),
    countryName(address.country),
  ];
  return (
    <div className="mt-10 grid gap-x-11 gap-y-8 border-t-2 border-ink pt-4 md:grid-cols-2">
      <section aria-labelledby="sums">
        <h2 id="sums" className="mb-2 font-display text-panel">
          What it costs
        </h2>
        <dl className="grid grid-cols-[1fr_auto] gap-y-1.5">
          {rows.map(({ term, value }) => (
            <div key={term} className="contents">
              <dt>{term}</dt>
              <dd className="pl-4 text-right font-figures">{value}</dd>
            </div>
          ))}
          <div className="contents font-bold">
            <dt className="border-t-1.5 border-ink pt-1.5">In all</dt>
            <dd className="border-t-1.5 border-ink pt-1.5 pl-4 text-right font-figures">{formatMoney(order.total)}</dd>
          </div>
          <div className="contents text-caption text-ink2">
            <dt>of that, tax at {order.taxBasisPoints / 100}&#8239;%</dt>
            <dd className="pl-4 text-right font-figures">{formatMoney(order.tax)}</dd>
          </div>
          {order.refunded.minor > 0 && (
            <div className="contents font-bold">
              <dt>Paid back</dt>
              <dd className="pl-4 text-right font-figures">{formatMoney(order.refunded)}</dd>
            </div>
          )}
        </dl>
      </section>
      <section aria-labelledby="goes-to">
        <h2 id="goes-to" className="mb-2 font-display text-panel">
          Where it goes
        </h2>
        <address className="not-italic">
          {lines.filter(Boolean).map((line) => (
            <span key={line} className="block">
              {line}
            </span>
          ))}
        </address>
        <p className="mt-2 text-caption text-ink2">
          {order.delivery.name}, {order.delivery.promise}. Mails go to {order.email}.
        </p>
        {order.giftNote !== '' && (
          <p className="mt-2 max-w-measure">
            <b>Gift note:</b> {order.giftNote}
          </p>
        )}
      </section>
    </div>
  );
}
