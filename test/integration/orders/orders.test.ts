import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, systemActor, visitor } from '@/services/access';
import { newId } from '@/services/ids';
import {
  cancel,
  changeBasket,
  claimOrder,
  listMyOrders,
  listOrders,
  markPaid,
  placeOrder,
  readBasket,
  readInvoice,
  readOrder,
  readOrderForMail,
} from '@/services/orders';
import { reading, write } from '@/services/record';
import { money } from '@/services/money';
import { testDatabase } from '../../builders/database';
import {
  type BuiltKit,
  customer,
  deliveryAndTax,
  kit,
  priceStep,
  setParts,
  staff,
  stockFor,
} from '../../builders/orders';

testDatabase();
let packer: Actor;
let owner: Actor;
let of: BuiltKit;

beforeAll(async () => {
  packer = await staff('Pia Lund', 'packer');
  owner = await staff('Mara Osk', 'owner');
  await deliveryAndTax();
  const parts = await setParts();
  of = await kit({ parts, name: 'Ebb Lamp', number: 7, letter: 'B' });
  await priceStep(of.kitId, 10, 3400);
  await stockFor(packer, parts, 200);
});

const address = { line1: '3 Quay Street', line2: '', town: 'Pellstow', postcode: 'PL3 4RT', country: 'GB' };
const form = (basketId: string) => ({
  basketId,
  email: 'ann@example.org',
  name: 'Ann Tarrant',
  address,
  deliveryCode: 'parcel',
});

async function basket(quantity = 1, what = of): Promise<string> {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: what.versionId, quantity });
  return basketId;
}
const order = async (actor: Actor = visitor, quantity = 1) => placeOrder(actor, form(await basket(quantity)));

const pay = async (orderId: string) => {
  const row = await reading()('orders').where({ id: orderId }).first('total_minor');
  const amount = money(row.total_minor, 'GBP');
  await write(systemActor('stripe'), (tx) => markPaid(tx, { orderId, reference: `pi_${orderId}`, amount }));
};

describe('a basket', () => {
  it('holds what is released, at the price of its step, and says what a larger number costs', async () => {
    const view = await readBasket(visitor, await basket(9));
    expect(view).toMatchObject({ count: 9, total: money(34_200, 'GBP') });
    expect(view.lines[0]).toMatchObject({ name: 'Ebb Lamp', letter: 'B', unit: money(3800, 'GBP'), trouble: null });
    expect(view.lines[0]?.cheaper).toEqual({ quantity: 10, total: money(34_000, 'GBP') });
    expect((await readBasket(visitor, await basket(10))).total).toEqual(money(34_000, 'GBP'));
  });

  it('refuses a version that is held, in check or withdrawn', async () => {
    for (const state of ['held', 'in-check', 'withdrawn'] as const) {
      const other = await kit({ state });
      await expect(basket(1, other)).rejects.toMatchObject({ kind: 'refused' });
    }
  });

  it('refuses a price of the buyer: fields that are not asked for are an error', async () => {
    const basketId = newId();
    const cheap = { basketId, versionId: of.versionId, quantity: 1, unit: money(1, 'GBP') };
    await expect(changeBasket(visitor, cheap)).rejects.toMatchObject({ kind: 'invalid' });
    const id = await basket();
    await expect(placeOrder(visitor, { ...form(id), total: 1 } as never)).rejects.toMatchObject({ kind: 'invalid' });
  });

  it('is emptied with 0, and an unknown one is empty', async () => {
    const basketId = await basket(2);
    expect(await changeBasket(visitor, { basketId, versionId: of.versionId, quantity: 0 })).toMatchObject({ count: 0 });
    expect((await readBasket(visitor, 'forged')).lines).toEqual([]);
  });
});

describe('placing an order', () => {
  it('takes the basket once: sent twice, it makes one order', async () => {
    const basketId = await basket();
    await placeOrder(visitor, form(basketId));
    await expect(placeOrder(visitor, form(basketId))).rejects.toThrow('basket is empty');
  });

  it('has to wait when one network address sets stock aside again and again; refused orders do not count', async () => {
    const from = '192.0.2.7';
    await expect(placeOrder(visitor, form(newId()), from)).rejects.toThrow('basket is empty');
    for (let n = 0; n < 30; n++) {
      const ref = await placeOrder(visitor, form(await basket()), from);
      await write(systemActor('stripe'), (tx) => cancel(tx, ref.orderId));
    }
    const basketId = await basket();
    await expect(placeOrder(visitor, form(basketId), from)).rejects.toMatchObject({ kind: 'busy' });
    expect((await readBasket(visitor, basketId)).count).toBe(1);
    await expect(placeOrder(visitor, form(basketId), '192.0.2.8')).resolves.toBeTruthy();
  });

  it('keeps the price it was placed at, with the tax of the country it goes to', async () => {
    const { orderId, key } = await order(visitor, 2);
    await reading()('prices').where({ kit_id: of.kitId, from_quantity: 1 }).update({ unit_minor: 9900 });
    const view = await readOrder(visitor, { orderId, key });
    await reading()('prices').where({ kit_id: of.kitId, from_quantity: 1 }).update({ unit_minor: 3800 });
    expect(view).toMatchObject({ linesTotal: money(7600, 'GBP'), total: money(8050, 'GBP'), taxBasisPoints: 2000 });
    const abroad = await placeOrder(visitor, {
      ...form(await basket()),
      address: { ...address, country: 'NO' },
      deliveryCode: 'abroad',
    });
    expect(await readOrder(visitor, abroad)).toMatchObject({ tax: money(0, 'GBP'), total: money(5050, 'GBP') });
  });

  it('refuses a way of sending that does not serve the country', async () => {
    const placed = placeOrder(visitor, { ...form(await basket()), address: { ...address, country: 'NO' } });
    await expect(placed).rejects.toThrow('does not serve that country');
  });

  it('names each field that needs another look', async () => {
    const wrong = { ...form(await basket()), email: 'ann', name: '', address: { ...address, line1: '', town: '' } };
    await expect(placeOrder(visitor, wrong)).rejects.toMatchObject({
      kind: 'invalid',
      fields: {
        email: expect.stringContaining('e-mail'),
        name: expect.any(String),
        'address.line1': expect.any(String),
        'address.town': expect.any(String),
      },
    });
  });

  it('refuses a version that was withdrawn while it lay in the basket', async () => {
    const parts = await setParts();
    const other = await kit({ parts });
    await stockFor(packer, parts, 5);
    const basketId = await basket(1, other);
    await reading()('versions').where({ id: other.versionId }).update({ state: 'withdrawn' });
    expect((await readBasket(visitor, basketId)).lines[0]?.trouble).toContain('no longer sold');
    await expect(placeOrder(visitor, form(basketId))).rejects.toThrow('no longer sold');
  });
});

describe('who sees an order', () => {
  it('its buyer, who holds its link, and the owner; to all others it is not there', async () => {
    const buyer = await customer('Ann Tarrant');
    const other = await customer('Bo Marsh');
    const designer = await staff('Isolde Hark', 'designer');
    const { orderId, key } = await order(buyer);
    for (const [actor, ref] of [
      [buyer, { orderId }],
      [visitor, { orderId, key }],
      [owner, { orderId }],
    ] as const) {
      expect((await readOrder(actor, ref)).id).toBe(orderId);
    }
    for (const actor of [visitor, other, designer]) {
      await expect(readOrder(actor, { orderId })).rejects.toMatchObject({ kind: 'missing' });
      await expect(readOrder(actor, { orderId, key: `${key}x` })).rejects.toMatchObject({ kind: 'missing' });
    }
  });

  it('a guest order is claimed by its link into one account, and by no second one', async () => {
    const buyer = await customer('Ann Tarrant');
    const other = await customer('Bo Marsh');
    const ref = await order();
    await expect(claimOrder(visitor, ref)).rejects.toMatchObject({ kind: 'forbidden' });
    await expect(claimOrder(other, { orderId: ref.orderId })).rejects.toMatchObject({ kind: 'missing' });
    await claimOrder(buyer, ref);
    expect((await listMyOrders(buyer)).orders.map((row) => row.id)).toEqual([ref.orderId]);
    await expect(claimOrder(other, ref)).rejects.toThrow('another account');
    expect((await listMyOrders(other)).orders).toEqual([]);
    await expect(listMyOrders(visitor)).rejects.toMatchObject({ kind: 'forbidden' });
  });

  it('its invoice opens for the same people, and says what was sold', async () => {
    const ref = await order(visitor, 2);
    await pay(ref.orderId);
    const { invoice } = await readOrder(visitor, ref);
    const invoiceId = invoice?.id ?? '';
    const paper = await readInvoice(visitor, { invoiceId, key: ref.key });
    expect(paper).toMatchObject({ number: invoice?.number, total: money(8050, 'GBP'), tax: money(1342, 'GBP') });
    expect(paper.lines).toMatchObject([{ name: 'Ebb Lamp', letter: 'B', quantity: 2 }]);
    await expect(readInvoice(visitor, { invoiceId })).rejects.toMatchObject({ kind: 'missing' });
    expect((await readInvoice(owner, { invoiceId })).number).toBe(paper.number);
  });

  it('its mail says what was ordered and links to it without signing in', async () => {
    const ref = await order();
    await pay(ref.orderId);
    const view = await readOrderForMail(systemActor('worker'), ref.orderId);
    expect(view).toMatchObject({ email: 'ann@example.org', lines: [{ name: 'Ebb Lamp', letter: 'B', quantity: 1 }] });
    expect(view.link).toMatch(new RegExp(`/orders/${ref.orderId}\\?key=${ref.key}$`));
    const stored = JSON.stringify(await reading()('orders').where({ id: ref.orderId }));
    expect(stored).not.toContain(ref.key);
    await expect(readOrderForMail(owner, ref.orderId)).rejects.toMatchObject({ kind: 'forbidden' });
  });
});

describe('the list of orders', () => {
  it('is paged without gap or repeat, newest first, and filtered by what waits', async () => {
    for (let n = 0; n < 45; n++) await order();
    const first = await listOrders(owner);
    const second = await listOrders(owner, { after: first.older ?? '' });
    const ids = [...first.orders, ...second.orders].map((row) => row.id);
    expect(first.orders).toHaveLength(40);
    expect(new Set(ids).size).toBe(ids.length);
    const toSend = (await listOrders(owner, { show: 'to-send' })).orders;
    expect(toSend.length).toBeGreaterThan(0);
    expect(toSend.every((row) => row.payment === 'paid')).toBe(true);
    await expect(listOrders(packer)).rejects.toMatchObject({ kind: 'forbidden' });
  });
});
