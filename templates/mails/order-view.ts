import { type Money, formatMoney, times } from '@/services/money';
import type { Part } from './letter';

/** What a mail about an order shows. */
export interface OrderMailView {
  number: string;
  name: string;
  lines: readonly { name: string; letter: string; quantity: number; unit: Money }[];
  total: Money;
  link: string;
  shipment?: { carrier: string; trackingNumber: string } | undefined;
}

export const whatWasOrdered = (view: OrderMailView): Part => ({
  rows: [
    ...view.lines.map((line) => [
      `${line.quantity} ×`,
      `${line.name}, version ${line.letter}`,
      formatMoney(times(line.unit, line.quantity)),
    ]),
    ['', 'Total with delivery and tax', formatMoney(view.total)],
  ],
});
