import { newId } from '../ids';
import { money, times } from '../money';
import { type Tx, canonicalJson } from '../record';
import * as rows from './rows';
import type { Invoice } from './schemas';
import { seller } from './seller';

/** Invoice numbers begin here. */
const firstNumber = 1;

/** Issues the order's invoice: the next number without a gap, its words frozen. Asked again it changes nothing. */
export async function numberInvoice(tx: Tx, orderId: string): Promise<void> {
  const known = await tx.sql('invoices').where({ order_id: orderId }).select('id').first<{ id: string } | undefined>();
  if (known) return;
  const order = await rows.getOrder(tx.sql, orderId);
  const delivery = (await rows.deliveries(tx.sql)).find((method) => method.code === order.deliveryCode);
  const number = await rows.nextNumber(tx.sql, 'invoice', firstNumber);
  const content: Invoice = {
    number,
    issuedAt: tx.now,
    order: { number: order.number, placedAt: order.placedAt, paidAt: tx.now },
    seller,
    buyer: { name: order.name, email: order.email, address: order.address },
    lines: (await rows.linesOf(tx.sql, orderId)).map(({ name, letter, quantity, unitMinor }) => {
      const unit = money(unitMinor, order.currency);
      return { name, letter, quantity, unit, total: times(unit, quantity) };
    }),
    delivery: { name: delivery?.name ?? order.deliveryCode, price: order.delivery },
    taxBasisPoints: order.taxBasisPoints,
    net: money(order.total.minor - order.tax.minor, order.currency),
    tax: order.tax,
    total: order.total,
  };
  await tx.sql('invoices').insert({
    id: newId(),
    number,
    order_id: orderId,
    issued_at: tx.now,
    content: canonicalJson(content),
  });
}
