import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Actor, visitor } from '@/services/access';
import { newId } from '@/services/ids';
import { changeBasket, placeOrder } from '@/services/orders';
import { receiveEvent } from '@/services/payments';
import { reading } from '@/services/record';
import { testDatabase } from '../builders/database';
import { charge, event, session, signatureOf, type Told } from '../builders/events';
import { type BuiltKit, deliveryAndTax, kit, setParts, staff, stockFor } from '../builders/orders';
import { crashAfter, stopCrashing } from '../builders/crashes';
import { ledgerFaults } from '../builders/ledger';

const database = testDatabase();
let packer: Actor;
let plenty: BuiltKit;
let none: BuiltKit;
/** npm run test:long asks for ten thousand. */
const schedules = Number(process.env['SCHEDULES'] ?? 100);

beforeAll(async () => {
  packer = await staff('Pia Lund', 'packer');
  await deliveryAndTax();
  const parts = await setParts();
  plenty = await kit({ parts });
  await stockFor(packer, parts, schedules * 3);
  const scarce = await setParts();
  none = await kit({ parts: scarce });
  await stockFor(packer, scarce, 1);
});

async function order(of: BuiltKit): Promise<{ orderId: string; amount: number }> {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: of.versionId, quantity: 1 });
  const { orderId } = await placeOrder(visitor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  });
  await reading()('orders')
    .where({ id: orderId })
    .update({ session_attempt: 1, session_id: `cs_test_${orderId}_1` });
  return { orderId, amount: 3800 + 450 };
}

const deliver = (told: Told) => receiveEvent(told.body, signatureOf(told.body));

/** Everything that a schedule may leave behind, without times and random ids. */
async function outcomeOf(orderId: string) {
  const sql = reading();
  const row = await sql('orders').where({ id: orderId }).first('payment', 'fulfilment', 'look_at_it');
  const money = await sql('order_money').where({ order_id: orderId }).select('kind', 'amount_minor');
  const total = (kind: string) =>
    money.filter((one) => one.kind === kind).reduce((all, one) => all + one.amount_minor, 0);
  const live = await sql('reservations')
    .where({ order_id: orderId })
    .whereIn('state', ['reserved', 'allocated'])
    .pluck('state');
  return {
    ...row,
    paidRows: money.filter((one) => one.kind === 'paid').length,
    paid: total('paid'),
    refunded: total('refunded'),
    invoices: (await sql('invoices').where({ order_id: orderId })).length,
    mails: await sql('outbox').where('key', `order-confirmed:${orderId}`).pluck('key'),
    live,
  };
}

describe('one paid checkout', () => {
  it(`makes one order, invoice, allocation and mail, whatever comes how often, in any order, with crashes (${schedules} schedules)`, async () => {
    let crashed = 0;
    const schedule = fc.record({
      refunds: fc.constantFrom([], [500], [500, 1200], [4250]),
      also: fc.subarray([
        'payment_intent.payment_failed',
        'checkout.session.expired',
        'unpaid',
        'payment_intent.succeeded',
      ]),
      repeats: fc.array(fc.integer({ min: 1, max: 5 }), { minLength: 8, maxLength: 8 }),
      order: fc.array(fc.nat(), { minLength: 40, maxLength: 40 }),
      crashes: fc.array(fc.option(fc.integer({ min: 1, max: 45 })), { minLength: 40, maxLength: 40 }),
    });
    await fc.assert(
      fc.asyncProperty(schedule, async ({ refunds, also, repeats, order: shuffle, crashes }) => {
        const { orderId, amount } = await order(plenty);
        const told = [
          event('checkout.session.completed', session({ orderId, amount })),
          ...refunds.map((refunded) => event('charge.refunded', charge({ orderId, amount, refunded }))),
          ...also.map((type) =>
            type === 'unpaid'
              ? event('checkout.session.completed', session({ orderId, amount, paymentStatus: 'unpaid' }))
              : event(type, session({ orderId, amount, status: type.endsWith('expired') ? 'expired' : 'open' })),
          ),
        ];
        const queue = told.flatMap((one, index) => new Array<Told>(repeats[index] ?? 1).fill(one));
        const deliveries = queue
          .map((one, index) => ({ one, at: shuffle[index] ?? 0 }))
          .sort((a, b) => a.at - b.at)
          .map(({ one }) => one);
        for (const [index, one] of deliveries.entries()) {
          const crash = crashes[index];
          if (crash !== null && crash !== undefined) {
            crashAfter(database.sql, crash);
            await deliver(one).catch(() => crashed++);
            stopCrashing(database.sql);
          }
        }
        // The provider sends again whatever was not answered with 200.
        for (const one of deliveries) await deliver(one);

        const refunded = Math.max(0, ...refunds);
        const isBack = refunded === amount;
        expect(await outcomeOf(orderId)).toEqual({
          payment: isBack ? 'refunded' : refunded > 0 ? 'part-refunded' : 'paid',
          fulfilment: isBack ? 'cancelled' : 'allocated',
          look_at_it: '',
          paidRows: 1,
          paid: amount,
          refunded,
          invoices: 1,
          mails: [`order-confirmed:${orderId}`],
          live: isBack ? [] : ['allocated'],
        });
      }),
      { numRuns: schedules },
    );
    expect(crashed).toBeGreaterThan(schedules);
    expect(await ledgerFaults(reading())).toEqual([]);
    const numbers: number[] = await reading()('invoices').orderBy('number').pluck('number');
    expect(numbers).toEqual(numbers.map((_, index) => index + 1));
  });

  it('that comes after the stock has gone leaves the order waiting, never a negative stock', async () => {
    const late = await order(none);
    const reservation = { order_id: late.orderId };
    await reading()('reservations').where(reservation).update({ expires_at: 1 });
    const quick = await order(none);
    for (const { orderId, amount } of [quick, late]) {
      await deliver(event('checkout.session.completed', session({ orderId, amount })));
    }
    expect((await outcomeOf(quick.orderId)).fulfilment).toBe('allocated');
    const outcome = await outcomeOf(late.orderId);
    expect(outcome).toMatchObject({ payment: 'paid', fulfilment: 'backordered', invoices: 1, live: [] });
    expect(outcome.look_at_it).toContain('short of a part');
    const mails = await reading()('outbox').where('key', 'like', `%:${late.orderId}`).orderBy('key').pluck('key');
    expect(mails).toEqual([`order-backordered:${late.orderId}`, `order-confirmed:${late.orderId}`]);
    expect(await ledgerFaults(reading())).toEqual([]);
  });

  it('is not booked where amount, currency or order differ from ours: a person looks at it', async () => {
    for (const wrong of [{ amount: 1 }, { currency: 'usd' }]) {
      const { orderId, amount } = await order(plenty);
      await deliver(event('checkout.session.completed', session({ orderId, amount, ...wrong })));
      const outcome = await outcomeOf(orderId);
      expect(outcome).toMatchObject({ payment: 'awaiting-payment', paidRows: 0, invoices: 0, mails: [] });
      expect(outcome.look_at_it).toContain('Compare');
      await deliver(event('checkout.session.completed', session({ orderId, amount, ...wrong })));
      const lines = await reading()('changes').where({ subject_id: orderId, action: 'order.to-look-at' });
      expect(lines).toHaveLength(1);
    }
    const stranger = event('checkout.session.completed', session({ orderId: newId(), amount: 4250 }));
    await expect(deliver(stranger)).resolves.toEqual({ received: true });
  });

  it('a second payment of the same order is put before a person, and makes no second invoice or mail', async () => {
    const { orderId, amount } = await order(plenty);
    await deliver(event('checkout.session.completed', session({ orderId, amount })));
    await deliver(event('checkout.session.completed', session({ orderId, amount, intent: 'pi_second', attempt: 2 })));
    const outcome = await outcomeOf(orderId);
    expect(outcome).toMatchObject({ payment: 'paid', fulfilment: 'allocated', paidRows: 2, invoices: 1 });
    expect(outcome.mails).toHaveLength(1);
    expect(outcome.look_at_it).toContain('second time');

    const second = { ...charge({ orderId, amount, refunded: amount }), id: 'ch_second', payment_intent: 'pi_second' };
    await deliver(event('charge.refunded', second));
    expect(await outcomeOf(orderId)).toMatchObject({
      payment: 'paid',
      fulfilment: 'allocated',
      refunded: amount,
      live: ['allocated'],
    });
    await deliver(event('charge.refunded', charge({ orderId, amount, refunded: amount })));
    expect(await outcomeOf(orderId)).toMatchObject({ payment: 'refunded', fulfilment: 'cancelled', live: [] });
  });
});
