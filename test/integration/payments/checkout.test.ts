import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { POST } from '@/app/api/stripe/route';
import { type Actor, systemActor, visitor } from '@/services/access';
import { newId } from '@/services/ids';
import { changeBasket, lapseReservations, placeOrder, readOrder } from '@/services/orders';
import { cancelOrder, receiveEvent, reconcile, startCheckout, useStripe } from '@/services/payments';
import { apiVersion, stripe } from '@/services/payments/client';
import { now, reading, setClock } from '@/services/record';
import { minutes } from '@/services/time';
import { startFakeStripe, type FakeStripe } from '../../fakes/stripe/start';
import { testDatabase } from '../../builders/database';
import { event, session, signatureOf } from '../../builders/events';
import { ledgerFaults } from '../../builders/ledger';
import { type BuiltKit, deliveryAndTax, kit, setParts, staff, stockFor } from '../../builders/orders';

testDatabase();
let fake: FakeStripe;
let endpoint: Server;
let of: BuiltKit;
let packer: Actor;

beforeAll(async () => {
  endpoint = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      const headers = { 'stripe-signature': `${request.headers['stripe-signature'] ?? ''}` };
      const body = Buffer.concat(chunks).toString('utf8');
      void POST(new Request('http://localhost/api/stripe', { method: 'POST', body, headers })).then(async (answer) =>
        response.writeHead(answer.status).end(await answer.text()),
      );
    });
  });
  await new Promise<void>((resolve) => endpoint.listen(0, '127.0.0.1', resolve));
  const { port } = endpoint.address() as AddressInfo; // listens on a port, not on a pipe
  const secret = process.env['STRIPE_WEBHOOK_SECRET'] ?? '';
  fake = await startFakeStripe({ webhook: `http://127.0.0.1:${port}`, secret });
  useStripe(
    new Stripe('sk_test_coilyard', { ...fake.sdk, apiVersion, maxNetworkRetries: 2, timeout: 2000, telemetry: false }),
  );
  packer = await staff('Pia Lund', 'packer');
  await deliveryAndTax();
  const parts = await setParts();
  of = await kit({ parts });
  await stockFor(packer, parts, 100);
});

beforeEach(() => fake.reset());

afterAll(async () => {
  useStripe(undefined);
  await fake.close();
  endpoint.close();
});

async function order(what = of, quantity = 1) {
  const basketId = newId();
  await changeBasket(visitor, { basketId, versionId: what.versionId, quantity });
  return placeOrder(visitor, {
    basketId,
    email: 'ann@example.org',
    name: 'Ann Tarrant',
    address: { line1: '3 Quay Street', town: 'Pellstow', country: 'GB' },
    deliveryCode: 'parcel',
  });
}
type Ref = Awaited<ReturnType<typeof order>>;

const sessionOf = (url: string) => new URL(url).pathname.split('/').at(-1) ?? '';
const sessionsMade = () =>
  fake.calls().filter((call) => call.method === 'POST' && call.path === '/v1/checkout/sessions').length;

async function pay(ref: Ref, card?: string) {
  const { url } = await startCheckout(visitor, ref);
  const result = await fake.pay(sessionOf(url), card === undefined ? {} : { card });
  await fake.settled();
  return result;
}

describe('paying an order', () => {
  it('shows the amounts of our rows, and is confirmed by the event, not by coming back', async () => {
    const ref = await order(of, 2);
    fake.set({ dropNext: 10 });
    const result = await pay(ref);
    expect(result.location).toContain(`/orders/${ref.orderId}?key=${ref.key}`);
    expect((await readOrder(visitor, ref)).payment).toBe('awaiting-payment');
    const paid = fake.events('checkout.session.completed')[0];
    await fake.deliver(paid?.id ?? '');
    const view = await readOrder(visitor, ref);
    expect(view).toMatchObject({
      payment: 'paid',
      fulfilment: 'allocated',
      total: { minor: 8050 },
      paid: { minor: 8050 },
    });
    expect(view.tax.minor).toBe(1342);
    expect(view.timeline[0]).toMatchObject({ name: 'Paid', state: 'now' });
    expect(view.invoice?.number).toBeGreaterThan(0);
  });

  it('opens one page however often it is asked, until that page has closed', async () => {
    const ref = await order();
    const first = await startCheckout(visitor, ref);
    expect(await startCheckout(visitor, ref)).toEqual(first);
    expect(sessionsMade()).toBe(1);
  });

  it('a second page for a paid order is refused', async () => {
    const ref = await order();
    await pay(ref);
    await expect(startCheckout(visitor, ref)).rejects.toThrow('paid already');
    expect(await reading()('order_money').where({ order_id: ref.orderId })).toHaveLength(1);
  });

  it('two browsers that come back to a closed page at once are sent to one new page, not to two', async () => {
    const ref = await order();
    const { url } = await startCheckout(visitor, ref);
    await stripe().checkout.sessions.expire(sessionOf(url));
    await fake.settled();
    const pages = await Promise.all([1, 2, 3].map(() => startCheckout(visitor, ref)));
    expect(new Set(pages.map((page) => page.url)).size).toBe(1);
    expect(pages[0]?.url).not.toBe(url);
    expect(sessionsMade()).toBeGreaterThan(1);
  });

  it('an order cancelled while its page is being made gets no page that anybody could pay on', async () => {
    const ref = await order();
    fake.set({ apiDelayMs: 300 });
    const starting = startCheckout(visitor, ref).catch((error: unknown) => error);
    await new Promise((resolve) => setTimeout(resolve, 100));
    await cancelOrder(visitor, ref);
    fake.set({ apiDelayMs: 0 });
    expect(await starting).toMatchObject({ kind: 'refused' });
    const pages = await stripe().checkout.sessions.list();
    expect(pages.data.map((page) => page.status)).toEqual(['expired']);
  });

  it('somebody else cannot pay or see it, and learns nothing of it', async () => {
    const ref = await order();
    const stranger = { orderId: ref.orderId, key: 'x'.repeat(43) };
    const unknown = { orderId: newId(), key: ref.key };
    const answers = await Promise.all(
      [stranger, unknown].flatMap((wrong) => [
        startCheckout(visitor, wrong as Ref).catch((error: unknown) => error),
        readOrder(visitor, wrong as Ref).catch((error: unknown) => error),
      ]),
    );
    for (const answer of answers) expect(answer).toMatchObject({ kind: 'missing' });
    expect(new Set(answers.map((answer) => (answer as Error).message)).size).toBe(1);
  });

  it('a refusal by the bank takes nothing, says so, and leaves the order to be paid again', async () => {
    const ref = await order();
    expect((await pay(ref, '4000000000000002')).outcome).toBe('refused');
    expect(await readOrder(visitor, ref)).toMatchObject({ payment: 'awaiting-payment', bankSaidNo: true });
    await pay(ref);
    expect(await readOrder(visitor, ref)).toMatchObject({ payment: 'paid', bankSaidNo: false });
  });

  it('gives the stock back when the page closes unpaid, and a later try sets it aside again', async () => {
    const parts = await setParts();
    const last = await kit({ parts });
    await stockFor(packer, parts, 1);
    const ref = await order(last);
    await startCheckout(visitor, ref);
    await expect(order(last)).rejects.toThrow('None of');
    const start = now();
    setClock(() => start + minutes(32));
    fake.advance(minutes(32));
    await fake.settled();
    const other = await order(last);
    await expect(startCheckout(visitor, ref)).rejects.toMatchObject({ kind: 'refused' });
    await cancelOrder(visitor, other);
    await expect(startCheckout(visitor, ref)).resolves.toBeTruthy();
    setClock(undefined);
    expect(await ledgerFaults(reading())).toEqual([]);
  });
});

describe('a provider that misbehaves', () => {
  it('one page is open after a reset, a 500, too many calls or an answer that never came', async () => {
    for (const fault of [
      'error-500',
      'reset',
      'rate-limit-429',
      'outage-503',
      'work-then-reset',
      'wrong-json',
    ] as const) {
      const ref = await order();
      fake.fail(fault, { path: '/v1/checkout/sessions' });
      await startCheckout(visitor, ref).catch((error: unknown) => {
        expect(error).toMatchObject({ kind: 'unavailable' });
      });
      const page = await startCheckout(visitor, ref);
      expect(await startCheckout(visitor, ref)).toEqual(page);
      const attempts = await reading()('orders').where({ id: ref.orderId }).pluck('session_attempt');
      expect(attempts[0]).toBeLessThanOrEqual(2);
    }
  });

  it('events that were lost are made good by looking up, and looking up twice changes nothing', async () => {
    // Pages of other tests, which the stand-in has forgotten.
    await reading()('orders').update({ session_id: null });
    const refs = [await order(), await order(), await order()];
    for (const ref of refs) {
      fake.set({ dropNext: 10 });
      await pay(ref);
    }
    fake.set({ dropNext: 0 });
    const start = now();
    setClock(() => start + minutes(11));
    expect(await reconcile(systemActor('worker'))).toMatchObject({ failed: 0 });
    const rows = async () => reading()('order_money').orderBy('id').select('id', 'reference');
    const once = await rows();
    await reconcile(systemActor('worker'));
    expect(await rows()).toEqual(once);
    setClock(undefined);
    for (const ref of refs) expect((await readOrder(visitor, ref)).payment).toBe('paid');
  });

  it('duplicated and shuffled events book each payment once', async () => {
    const refs = [await order(), await order(), await order()];
    fake.set({ duplicate: 3 });
    for (const ref of refs) await pay(ref);
    for (const ref of refs) {
      expect(await reading()('order_money').where({ order_id: ref.orderId })).toHaveLength(1);
      expect(await reading()('invoices').where({ order_id: ref.orderId })).toHaveLength(1);
    }
  });
});

describe('cancelling', () => {
  it('a paid order pays the money back and gives the stock back', async () => {
    const ref = await order();
    await pay(ref);
    const cancelled = await cancelOrder(visitor, ref);
    expect(cancelled.fulfilment).toBe('cancelled');
    await fake.settled();
    expect(await readOrder(visitor, ref)).toMatchObject({ payment: 'refunded', refunded: { minor: 4250 } });
    expect(await ledgerFaults(reading())).toEqual([]);
  });

  it('is finished later when the provider did not answer, and pays back once', async () => {
    const ref = await order();
    await pay(ref);
    fake.fail('reset', { times: 3, path: '/v1/refunds' });
    fake.fail('error-500', { times: 1, path: '/v1/refunds' });
    expect(await cancelOrder(visitor, ref)).toMatchObject({ fulfilment: 'cancelled', payment: 'paid' });
    for (let round = 0; round < 3; round++) await reconcile(systemActor('worker'));
    await fake.settled();
    expect(await readOrder(visitor, ref)).toMatchObject({ payment: 'refunded', refunded: { minor: 4250 } });
  });

  it('an unpaid order closes its payment page first, so that nobody pays for it', async () => {
    const ref = await order();
    const { url } = await startCheckout(visitor, ref);
    expect(await cancelOrder(visitor, ref)).toMatchObject({ payment: 'cancelled', fulfilment: 'cancelled' });
    expect((await fake.pay(sessionOf(url))).outcome).not.toBe('paid');
    await expect(startCheckout(visitor, ref)).rejects.toThrow('cancelled');
  });

  it('is refused once a packer has begun', async () => {
    const ref = await order();
    await pay(ref);
    await reading()('orders').where({ id: ref.orderId }).update({ fulfilment: 'picking' });
    await expect(cancelOrder(visitor, ref)).rejects.toThrow('packers have begun');
    expect((await readOrder(visitor, ref)).payment).toBe('paid');
  });
});

describe('an event', () => {
  const whole = async () => {
    const sql = reading();
    const tables = [
      'orders',
      'order_money',
      'invoices',
      'payment_events',
      'outbox',
      'part_stock',
      'reservations',
      'changes',
    ];
    const rows = [];
    for (const table of tables) rows.push(await sql(table).select());
    return JSON.stringify(rows);
  };
  const send = (body: string, signature: string | null) =>
    POST(
      new Request('http://localhost/api/stripe', {
        method: 'POST',
        body,
        headers: signature === null ? {} : { 'stripe-signature': signature },
      }),
    );

  it('with a bad signature changes nothing: one bit, other spaces, no header, another secret, too old', async () => {
    const { orderId } = await order();
    const { body } = event('checkout.session.completed', session({ orderId, amount: 4250 }));
    const good = signatureOf(body);
    const before = await whole();
    for (let n = 0; n < 200; n++) {
      const at = (n * 7919) % body.length;
      const flipped = body.slice(0, at) + String.fromCharCode(body.charCodeAt(at) ^ 1) + body.slice(at + 1);
      expect((await send(flipped, good)).status).toBe(400);
    }
    const wrong: [string, string | null][] = [
      [JSON.stringify(JSON.parse(body), null, 2), good],
      [body, null],
      [body, ''],
      [body, signatureOf(body, { secret: 'whsec_other' })],
      [body, signatureOf(body, { ageSeconds: 301 })],
      [body, signatureOf(body, { ageSeconds: 86_400 })],
    ];
    for (const [text, signature] of wrong) {
      const answer = await send(text, signature);
      expect(answer.status).toBe(400);
      expect(await answer.json()).toEqual({ received: false });
    }
    expect(await whole()).toBe(before);
    expect((await send(body, signatureOf(body, { ageSeconds: 290 }))).status).toBe(200);
    expect(await whole()).not.toBe(before);
  });

  it('that comes again changes no row', async () => {
    const { orderId } = await order();
    const { body } = event('checkout.session.completed', session({ orderId, amount: 4250 }));
    await send(body, signatureOf(body));
    const before = await whole();
    expect((await send(body, signatureOf(body))).status).toBe(200);
    expect(await whole()).toBe(before);
  });

  it('of a kind nobody here knows is taken and noted', async () => {
    for (let n = 0; n < 20; n++) {
      const { body } = event(`unknown.kind_${n}`, { id: `x_${n}`, object: 'thing' });
      await expect(receiveEvent(body, signatureOf(body))).resolves.toEqual({ received: true });
    }
  });
});

it('a lapsed order that waits for stock is served when a delivery comes, oldest payment first', async () => {
  const parts = await setParts();
  const scarce = await kit({ parts });
  await stockFor(packer, parts, 2);
  const refs = [await order(scarce), await order(scarce)];
  await reading()('reservations')
    .whereIn(
      'order_id',
      refs.map((ref) => ref.orderId),
    )
    .update({ expires_at: 1 });
  const quick = await order(scarce, 2);
  for (const [index, ref] of refs.entries()) {
    const start = now();
    setClock(() => start + index + 1);
    const { body } = event('checkout.session.completed', session({ orderId: ref.orderId, amount: 4250 }));
    await receiveEvent(body, signatureOf(body));
  }
  setClock(undefined);
  expect(quick.orderId).toBeTruthy();
  await stockFor(packer, parts, 1);
  expect((await lapseReservations(systemActor('worker'))).served).toEqual([refs[0]?.orderId]);
  expect((await readOrder(visitor, refs[1]!)).headline).toContain('short of a part');
});
