import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { systemActor, visitor } from '@/services/access';
import { newId } from '@/services/ids';
import { bookRefund, changeBasket, markPaid, placeOrder } from '@/services/orders';
import { Invoice } from '@/services/orders/schemas';
import { money } from '@/services/money';
import { reading, write } from '@/services/record';
import { testDatabase } from '../builders/database';
import { type BuiltKit, deliveryAndTax, kit, priceStep, setParts, staff, stockFor } from '../builders/orders';
import { crashAfter, stopCrashing } from '../builders/crashes';

const database = testDatabase();
const kits: BuiltKit[] = [];

beforeAll(async () => {
  const packer = await staff('Pia Lund', 'packer');
  await deliveryAndTax();
  for (const price of [1999, 3850, 99]) {
    const parts = await setParts();
    const of = await kit({ parts, price });
    await priceStep(of.kitId, 5, price - 20);
    await stockFor(packer, parts, 2000);
    kits.push(of);
  }
});

describe('the money of the yard', () => {
  it('balances to the penny: paid less refunded is invoiced less what went back, and invoices have no gap', async () => {
    const basket = fc.array(fc.record({ kit: fc.nat({ max: 2 }), quantity: fc.integer({ min: 1, max: 9 }) }), {
      minLength: 1,
      maxLength: 3,
    });
    const schedule = fc.record({
      basket,
      country: fc.constantFrom('GB', 'NO'),
      isPaid: fc.boolean(),
      refund: fc.option(fc.double({ min: 0, max: 1, noNaN: true })),
      crash: fc.option(fc.integer({ min: 1, max: 60 })),
    });
    await fc.assert(
      fc.asyncProperty(schedule, async ({ basket: lines, country, isPaid, refund, crash }) => {
        const basketId = newId();
        for (const line of lines) {
          const versionId = kits[line.kit]!.versionId;
          await changeBasket(visitor, { basketId, versionId, quantity: line.quantity });
        }
        const { orderId } = await placeOrder(visitor, {
          basketId,
          email: 'ann@example.org',
          name: 'Ann Tarrant',
          address: { line1: '3 Quay Street', town: 'Pellstow', country },
          deliveryCode: country === 'GB' ? 'parcel' : 'abroad',
        });
        const order = await reading()('orders').where({ id: orderId }).first();
        if (!isPaid) return;
        const amount = money(order.total_minor, 'GBP');
        const pay = () =>
          write(systemActor('stripe'), (tx) => markPaid(tx, { orderId, reference: `pi_${orderId}`, amount }));
        if (crash !== null) {
          crashAfter(database.sql, crash);
          await pay().catch(() => undefined);
          stopCrashing(database.sql);
        }
        await pay();
        if (refund !== null) {
          const total = money(Math.floor(amount.minor * refund), 'GBP');
          await write(systemActor('stripe'), (tx) => bookRefund(tx, { orderId, charge: `ch_${orderId}`, total }));
        }
      }),
      { numRuns: 120 },
    );

    const sql = reading();
    const rows = await sql('order_money').select('order_id', 'kind', 'amount_minor');
    const total = (orderId: string, kind: string) =>
      rows
        .filter((row) => row.order_id === orderId && row.kind === kind)
        .reduce((all, row) => all + row.amount_minor, 0);
    const invoices = await sql('invoices').orderBy('number').select('number', 'order_id', 'content');
    expect(invoices.length).toBeGreaterThan(30);
    expect(invoices.map((row) => row.number)).toEqual(invoices.map((_, index) => index + 1));
    for (const row of invoices) {
      const invoice = Invoice.parse(JSON.parse(row.content));
      expect(total(row.order_id, 'paid')).toBe(invoice.total.minor);
      expect(total(row.order_id, 'refunded')).toBeLessThanOrEqual(invoice.total.minor);
      expect(invoice.net.minor + invoice.tax.minor).toBe(invoice.total.minor);
      const lines = invoice.lines.reduce((all, line) => all + line.unit.minor * line.quantity, 0);
      expect(lines + invoice.delivery.price.minor).toBe(invoice.total.minor);
      expect(invoice.lines.every((line) => line.total.minor === line.unit.minor * line.quantity)).toBe(true);
    }
    const paidOrders = await sql('orders').whereNot('payment', 'awaiting-payment').pluck('id');
    expect(invoices.map((row) => row.order_id).sort()).toEqual(paidOrders.sort());
  });

  it('an issued invoice is never changed', async () => {
    await expect(reading()('invoices').update({ content: '{}' })).rejects.toThrow('append-only');
    await expect(reading()('order_money').update({ amount_minor: 1 })).rejects.toThrow('append-only');
  });
});
