import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { anOrder, openTill, SECRET, type Till } from './till';

let till: Till;
beforeEach(async () => {
  till = await openTill();
});
afterEach(() => till.close());

async function pay(): Promise<string> {
  const { id } = await till.stripe.checkout.sessions.create(anOrder());
  await till.fake.pay(id);
  return id;
}

const arrivedIds = () => till.endpoint.events().map(({ id }) => id);
const sentIds = () => till.fake.events().map(({ id }) => id);

describe('an event', () => {
  it('comes again with growing waits until the shop says 2xx', async () => {
    till.endpoint.answers = [500, 302, 500, 404, 200];
    await pay();
    await till.fake.settled();
    expect(till.endpoint.arrivals.length).toBe(6);
    expect(till.fake.deliveries().map(({ state }) => state)).toEqual(['delivered', 'delivered']);
    expect((await till.stripe.events.list({ delivery_success: true })).data).toHaveLength(2);
  });

  it('is given up after the last wait and can be fetched and sent again', async () => {
    till.endpoint.answers = Array.from({ length: 10 }, () => 500);
    const session = await pay();
    await till.fake.settled();
    expect(till.fake.deliveries().map(({ state, attempts }) => [state, attempts.length])).toEqual([
      ['given up', 5],
      ['given up', 5],
    ]);
    const lost = await till.stripe.events.list({ delivery_success: false, types: ['checkout.session.completed'] });
    expect(lost.data).toMatchObject([{ data: { object: { id: session } } }]);
    const again = await till.fake.deliver(lost.data[0]?.id ?? '');
    expect(again.status).toBe(200);
    expect((await till.stripe.events.list({ delivery_success: false })).data).toHaveLength(1);
  });

  it('reaches a shop that was away while it was made', async () => {
    const { url } = till.endpoint;
    till.fake.sendTo('http://127.0.0.1:9/nobody');
    await pay();
    till.fake.sendTo(url);
    await till.fake.settled();
    expect(arrivedIds().sort()).toEqual(sentIds().sort());
  });

  it('keeps the object as it was when it happened', async () => {
    till.fake.set({ hold: true });
    await pay();
    const [succeeded] = till.fake.events('payment_intent.succeeded');
    const [intent] = (await till.stripe.paymentIntents.list()).data;
    await till.stripe.refunds.create({ payment_intent: intent?.id ?? '', amount: 100 });
    await till.stripe.refunds.create({ payment_intent: intent?.id ?? '', amount: 200 });
    till.fake.set({ hold: false });
    await till.fake.settled();
    expect(arrivedIds()[0]).toBe(succeeded?.id);
    const refunds = till.endpoint.events().filter((event) => event.type === 'charge.refunded');
    expect(refunds.map((event) => event.data.object)).toMatchObject([
      { amount_refunded: 100 },
      { amount_refunded: 300 },
    ]);
  });
});

describe('a test switch', () => {
  it('doubles each event', async () => {
    till.fake.set({ duplicate: 2 });
    await pay();
    await till.fake.settled();
    expect(arrivedIds().sort()).toEqual(
      sentIds()
        .flatMap((id) => [id, id, id])
        .sort(),
    );
  });

  it('turns the order round', async () => {
    till.fake.set({ reorder: 4 });
    await pay();
    await till.fake.settled();
    expect(arrivedIds()).toEqual([]);
    await pay();
    await till.fake.settled();
    expect(arrivedIds()).toEqual(sentIds().reverse());
  });

  it('sends what waits to be reordered when it is switched off', async () => {
    till.fake.set({ reorder: 9 });
    await pay();
    till.fake.set({ reorder: 0 });
    await till.fake.settled();
    expect(arrivedIds()).toEqual(sentIds().reverse());
  });

  it('drops the next event, or every third, which can still be listed', async () => {
    till.fake.set({ dropNext: 1 });
    await pay();
    await till.fake.settled();
    expect(arrivedIds()).toEqual(sentIds().slice(1));
    till.fake.reset();
    till.endpoint.arrivals.length = 0;
    till.fake.set({ dropEvery: 3 });
    await pay();
    await pay();
    await pay();
    await till.fake.settled();
    expect(arrivedIds()).toHaveLength(4);
    expect(till.fake.deliveries().map(({ state }) => state === 'dropped')).toEqual([
      false,
      false,
      true,
      false,
      false,
      true,
    ]);
    expect((await till.stripe.events.list()).data).toHaveLength(6);
  });

  it('delays delivery until the clock has moved on', async () => {
    till.fake.set({ webhookDelayMs: 3_600_000 });
    await pay();
    expect(till.fake.deliveries().map(({ attempts }) => attempts.length)).toEqual([0, 0]);
    till.fake.advance(3_600_000);
    await till.fake.settled();
    expect(till.endpoint.arrivals).toHaveLength(2);
  });

  it('can be thrown over HTTP, and a wrong order is refused', async () => {
    const order = async (body: unknown, type = 'application/json') => {
      const response = await fetch(`${till.fake.url}/_control`, {
        method: 'POST',
        headers: { 'content-type': type },
        body: JSON.stringify(body),
      });
      const answer: unknown = await response.json();
      return { status: response.status, answer };
    };
    expect(await order({ do: 'set', switches: { hold: true } })).toMatchObject({
      status: 200,
      answer: { switches: { hold: true } },
    });
    const session = await pay();
    expect(await order({ do: 'deliveries' })).toMatchObject({
      answer: { deliveries: [{ state: 'held' }, { state: 'held' }] },
    });
    const [event] = till.fake.events('checkout.session.completed');
    expect(await order({ do: 'deliver', event: event?.id })).toMatchObject({ answer: { status: 200 } });
    expect(till.endpoint.events()).toMatchObject([{ data: { object: { id: session } } }]);
    await order({ do: 'fail', fault: 'error-500', times: 1 });
    await expect(till.stripe.refunds.list()).rejects.toMatchObject({ statusCode: 500 });
    expect((await order({ do: 'advance', ms: 1000 })).status).toBe(200);
    expect((await order({ do: 'dance' })).status).toBe(400);
    expect((await order({ do: 'reset' }, 'text/plain')).status).toBe(405);
    expect((await order({ do: 'reset' })).status).toBe(200);
    expect((await till.stripe.events.list()).data).toEqual([]);
  });
});

describe('a signature', () => {
  it('grows too old, breaks with the body, and is missing when left out', async () => {
    await pay();
    await till.fake.settled();
    const [event] = till.fake.events('checkout.session.completed');
    const id = event?.id ?? '';
    till.endpoint.arrivals.length = 0;
    await till.fake.deliver(id, { ageSeconds: 299 });
    expect(till.endpoint.events()).toHaveLength(1);
    for (const options of [
      { ageSeconds: 302 },
      { tamper: (body: string) => body.replace('9990', '1') },
      { secret: 'whsec_another' },
      { unsigned: true },
    ]) {
      till.endpoint.arrivals.length = 0;
      await till.fake.deliver(id, options);
      expect(() => till.endpoint.events()).toThrow(Stripe.errors.StripeSignatureVerificationError);
    }
    till.endpoint.arrivals.length = 0;
    await till.fake.deliver(id, { alter: (body) => body.replaceAll('9990', '1') });
    expect(till.endpoint.events()).toMatchObject([{ id, data: { object: { amount_total: 1 } } }]);
  });

  it('is made with both secrets while they rotate', async () => {
    await till.close();
    till = await openTill({ secret: ['whsec_the_new_one', SECRET] });
    await pay();
    await till.fake.settled();
    expect(till.endpoint.events()).toHaveLength(2);
    const { body = '', signature = '' } = till.endpoint.arrivals[0] ?? {};
    expect(Stripe.webhooks.constructEvent(body, signature, 'whsec_the_new_one').object).toBe('event');
  });
});
