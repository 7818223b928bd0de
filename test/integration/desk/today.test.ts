import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, systemActor, visitor } from '@/services/access';
import { readToday } from '@/services/desk';
import { newId } from '@/services/ids';
import { money } from '@/services/money';
import { bookRefund, changeBasket, markPaid, placeOrder } from '@/services/orders';
import { now, reading, setClock, write } from '@/services/record';
import { days } from '@/services/time';
import { testDatabase } from '../../builders/database';
import { type BuiltKit, customer, deliveryAndTax, kit, setParts, staff, stockFor } from '../../builders/orders';

testDatabase();
let owner: Actor;
let of: BuiltKit;

beforeAll(async () => {
  owner = await staff('Mara Osk', 'owner');
  await deliveryAndTax();
  const parts = await setParts();
  of = await kit({ parts, name: 'Ebb Lamp', number: 7 });
  await stockFor(await staff('Pia Lund', 'packer'), parts, 30);
  await kit({ name: 'Tollgate', number: 4, code: 'TG4', price: null });
});

async function paid(quantity: number, ago: number): Promise<string> {
  const start = now();
  setClock(() => start - ago);
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: of.versionId, quantity });
  const { orderId } = await placeOrder(visitor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  });
  const amount = money(quantity * 3800 + 450, 'GBP');
  await write(systemActor('stripe'), (tx) => markPaid(tx, { orderId, reference: `pi_${orderId}`, amount }));
  setClock(undefined);
  return orderId;
}

describe('the desk today', () => {
  it('counts what came in, what goes out and what is late', async () => {
    const late = await paid(1, days(3));
    await paid(2, 0);
    const back = await paid(1, days(1));
    const total = money(4250, 'GBP');
    await write(systemActor('stripe'), (tx) => bookRefund(tx, { orderId: back, charge: 'ch_1', total }));
    const sent = await paid(3, days(1));
    await reading()('orders').where({ id: sent }).update({ fulfilment: 'shipped', shipped_at: now() });

    const today = await readToday(owner);
    expect(today.figures).toMatchObject({
      today: money(8050, 'GBP'),
      week: money(4250 + 8050 + 4250 + 11_850, 'GBP'),
      boxesSent: 3,
      refunded: total,
      refundedOrders: 1,
    });
    expect(today.figures.hoursToSend).toBeCloseTo(24, 1);
    expect(today.toSend).toEqual({ orders: 2, boxes: 3, unpaid: 0 });
    expect(today.late.map((order) => order.orderId)).toEqual([late]);
    expect(today.onSale.find((one) => one.name === 'Ebb Lamp')).toMatchObject({ sold: 6, ready: 24 });
  });

  it('says what waits on the owner: a price to set, a part that has run out, an order to look at', async () => {
    const odd = await paid(1, 0);
    await reading()('orders').where({ id: odd }).update({ look_at_it: 'Paid a second time.' });
    const { waiting } = await readToday(owner);
    expect(waiting).toContainEqual(
      expect.objectContaining({ kind: 'order', orderId: odd, why: 'Paid a second time.' }),
    );
    expect(waiting).toContainEqual({ kind: 'price', code: 'TG4', name: 'Tollgate' });
    expect(waiting.some((one) => one.kind === 'short' && one.code === 'TG4')).toBe(true);
  });

  it('is the owner’s alone', async () => {
    for (const actor of [visitor, await customer('Bo Marsh'), await staff('Pia Lund', 'packer')]) {
      await expect(readToday(actor)).rejects.toMatchObject({ kind: 'forbidden' });
    }
  });
});
