import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { anOrder, openTill, sdkFor, type Till } from './till';

let till: Till;
beforeEach(async () => {
  till = await openTill();
});
afterEach(() => till.close());

async function paidSession(): Promise<Stripe.Checkout.Session> {
  const { id } = await till.stripe.checkout.sessions.create(anOrder());
  await till.fake.pay(id);
  await till.fake.settled();
  return till.stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent.latest_charge'] });
}

function chargeOf(session: Stripe.Checkout.Session): Stripe.Charge {
  const intent = session.payment_intent;
  if (intent === null || typeof intent === 'string') throw new Error('payment intent not expanded');
  if (intent.latest_charge === null || typeof intent.latest_charge === 'string') throw new Error('charge not expanded');
  return intent.latest_charge;
}

describe('a payment', () => {
  it('of a good card sends the buyer back to the shop and a signed event to it', async () => {
    const session = await till.stripe.checkout.sessions.create(anOrder());
    expect(session).toMatchObject({ status: 'open', payment_status: 'unpaid', amount_total: 9990, currency: 'eur' });

    const result = await till.fake.pay(session.id, { email: 'ada@example.org', name: 'Ada' });
    expect(result).toMatchObject({ outcome: 'paid', status: 303 });
    expect(result.location).toBe(`http://127.0.0.1:3000/orders/17?session=${session.id}`);

    await till.fake.settled();
    expect(till.endpoint.types().sort()).toEqual(['checkout.session.completed', 'payment_intent.succeeded']);
    const completed = till.endpoint.events().find((event) => event.type === 'checkout.session.completed');
    expect(completed).toMatchObject({
      api_version: Stripe.API_VERSION,
      data: {
        object: {
          id: session.id,
          payment_status: 'paid',
          amount_total: 9990,
          metadata: { order: 'order-17' },
          customer_details: { email: 'ada@example.org', name: 'Ada' },
        },
      },
    });
  });

  it('leaves a charge with its fee behind, reachable from the session', async () => {
    const charge = chargeOf(await paidSession());
    expect(charge).toMatchObject({ amount: 9990, paid: true, status: 'succeeded', amount_refunded: 0 });
    expect(charge.payment_method_details?.card).toMatchObject({ brand: 'visa', last4: '4242' });
    const [money] = (await till.stripe.balanceTransactions.list({ source: charge.id })).data;
    expect(money).toMatchObject({ amount: 9990, fee: 175, net: 9815, type: 'charge' });
    const intents = await till.stripe.paymentIntents.list();
    expect(intents.data.map((intent) => intent.latest_charge)).toEqual([charge.id]);
  });

  it('refused by the bank keeps what was typed, but for the card, and can be tried again', async () => {
    const session = await till.stripe.checkout.sessions.create(anOrder());
    const refused = await till.fake.pay(session.id, { card: '4000000000000002', name: 'Ada <Lovelace>' });
    expect(refused.outcome).toBe('refused');
    expect(refused.page).toContain('Your bank said no');
    expect(refused.page).toContain('value="Ada &#60;Lovelace&#62;"');
    expect(refused.page).toContain('ended in 0002');
    expect(refused.page).not.toContain('value="4000');

    const after = await till.stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] });
    expect(after).toMatchObject({
      status: 'open',
      payment_intent: {
        status: 'requires_payment_method',
        last_payment_error: { type: 'card_error', code: 'card_declined', decline_code: 'generic_decline' },
      },
    });
    expect((await till.fake.pay(session.id)).outcome).toBe('paid');
    await till.fake.settled();
    expect(till.endpoint.types().sort()).toEqual([
      'checkout.session.completed',
      'payment_intent.payment_failed',
      'payment_intent.succeeded',
    ]);
  });

  it('without enough money on the card says so', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    expect((await till.fake.pay(id, { card: '4000000000009995' })).page).toContain('not enough money');
    const [failed] = till.fake.events('payment_intent.payment_failed');
    expect(failed?.data.object).toMatchObject({ last_payment_error: { decline_code: 'insufficient_funds' } });
  });

  it('that the bank asks about completes when the holder passes', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    const asked = await till.fake.pay(id, { card: '4000002760003184' });
    expect(asked).toMatchObject({ outcome: 'asked', location: `/pay/${id}/authenticate` });
    const [intent] = (await till.stripe.paymentIntents.list()).data;
    expect(intent).toMatchObject({ status: 'requires_action', next_action: { type: 'redirect_to_url' } });

    const passed = await till.fake.pay(id, { card: '4000002500003155', authenticate: 'complete' });
    expect(passed.outcome).toBe('paid');
    expect(await till.stripe.checkout.sessions.retrieve(id)).toMatchObject({
      status: 'complete',
      payment_status: 'paid',
    });
  });

  it('that the bank asks about is refused when the holder fails', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    const failed = await till.fake.pay(id, { card: '4000002500003155', authenticate: 'fail' });
    expect(failed.outcome).toBe('refused');
    expect(failed.page).toContain('could not confirm that it is you');
    expect(await till.stripe.checkout.sessions.retrieve(id)).toMatchObject({
      status: 'open',
      payment_status: 'unpaid',
    });
  });

  it('is not taken twice, however often the form is sent', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    const results = await Promise.all([till.fake.pay(id), till.fake.pay(id), till.fake.pay(id)]);
    expect(results.filter(({ outcome }) => outcome === 'paid')).toHaveLength(1);
    expect(results.filter(({ page }) => page.includes('cannot be paid a second time'))).toHaveLength(2);
    expect((await till.stripe.balanceTransactions.list()).data).toHaveLength(1);
  });

  it('made with another card leaves nothing waiting at the bank', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    await till.fake.pay(id, { card: '4000002760003184' });
    await till.fake.pay(id);
    expect(() => till.fake.settle(id, 'succeeded')).toThrow('No payment waits');
    expect((await till.stripe.balanceTransactions.list()).data).toHaveLength(1);
  });

  it('with a past date, no card of the list or no e-mail names each fault at its field', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    const { page, outcome } = await till.fake.pay(id, {
      card: '4111111111111111',
      expiry: '01/20',
      cvc: '1',
      email: 'ada',
    });
    expect(outcome).toBe('refused');
    for (const field of ['email', 'number', 'expiry', 'cvc']) expect(page).toContain(`id="${field}-wrong"`);
    expect(page).toContain('Only test cards work here');
    expect((await till.stripe.paymentIntents.list()).data).toEqual([]);
  });

  it('that settles late completes unpaid and is paid or failed by a later event', async () => {
    till.fake.set({ settleLateNext: 2 });
    const [first, second] = [
      await till.stripe.checkout.sessions.create(anOrder()),
      await till.stripe.checkout.sessions.create(anOrder()),
    ];
    for (const { id } of [first, second]) await till.fake.pay(id);
    expect(await till.stripe.checkout.sessions.retrieve(first.id)).toMatchObject({
      status: 'complete',
      payment_status: 'unpaid',
    });
    till.fake.settle(first.id, 'succeeded');
    till.fake.settle(second.id, 'failed');
    expect(till.fake.events('checkout.session.async_payment_succeeded')[0]?.data.object).toMatchObject({
      id: first.id,
      payment_status: 'paid',
    });
    expect(till.fake.events('checkout.session.async_payment_failed')[0]?.data.object).toMatchObject({
      id: second.id,
      payment_status: 'unpaid',
    });
  });

  it('can be disputed by the holder', async () => {
    const charge = chargeOf(await paidSession());
    till.fake.dispute(charge.id);
    await till.fake.settled();
    const disputed = till.endpoint.events().find((event) => event.type === 'charge.dispute.created');
    expect(disputed?.data.object).toMatchObject({ charge: charge.id, amount: 9990, reason: 'fraudulent' });
    expect(await till.stripe.charges.retrieve(charge.id)).toMatchObject({ disputed: true });
  });
});

describe('a session', () => {
  it('expires at its time, says so on its page and sends the event', async () => {
    const inHalfAnHour = Math.floor(till.fake.now() / 1000) + 1800;
    const { id } = await till.stripe.checkout.sessions.create(anOrder({ expires_at: inHalfAnHour }));
    till.fake.advance(29 * 60_000);
    expect((await till.stripe.checkout.sessions.retrieve(id)).status).toBe('open');
    till.fake.advance(2 * 60_000);
    expect((await till.stripe.checkout.sessions.retrieve(id)).status).toBe('expired');
    await till.fake.settled();
    expect(till.endpoint.types()).toEqual(['checkout.session.expired']);
    const late = await till.fake.pay(id);
    expect(late.page).toContain('has expired');
    expect((await till.stripe.paymentIntents.list()).data).toEqual([]);
  });

  it('is given 24 hours at most and half an hour at least, unless a test allows less', async () => {
    const now = Math.floor(Date.now() / 1000);
    const soon = anOrder({ expires_at: now + 60 });
    await expect(till.stripe.checkout.sessions.create(soon)).rejects.toMatchObject({ param: 'expires_at' });
    const late = anOrder({ expires_at: now + 25 * 3600 });
    await expect(till.stripe.checkout.sessions.create(late)).rejects.toMatchObject({ param: 'expires_at' });
    const brief = await openTill({ minExpirySeconds: 1 });
    const session = await brief.stripe.checkout.sessions.create(soon);
    expect(session.expires_at).toBe(now + 60);
    await brief.close();
  });

  it('can be expired by the shop while it is open, and only then', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder());
    expect(await till.stripe.checkout.sessions.expire(id)).toMatchObject({ status: 'expired', url: null });
    await expect(till.stripe.checkout.sessions.expire(id)).rejects.toThrow('status of `expired`');
    const paid = await paidSession();
    await expect(till.stripe.checkout.sessions.expire(paid.id)).rejects.toThrow('status of `complete`');
  });

  it('lists its lines with price and product, and is found by state and page by page', async () => {
    const made: string[] = [];
    for (let i = 0; i < 3; i += 1) made.push((await till.stripe.checkout.sessions.create(anOrder())).id);
    const lines = await till.stripe.checkout.sessions.listLineItems(made[0] ?? '', { expand: ['data.price.product'] });
    expect(lines.data.map((line) => [line.description, line.quantity, line.amount_total])).toEqual([
      ['Kit 7 B', 2, 9300],
      ['Postage', 1, 690],
    ]);
    expect(lines.data[0]?.price).toMatchObject({ unit_amount: 4650, product: { object: 'product', name: 'Kit 7 B' } });
    await till.stripe.checkout.sessions.expire(made[1] ?? '');
    const open = await till.stripe.checkout.sessions.list({ status: 'open' });
    expect(open.data.map(({ id }) => id)).toEqual([made[2], made[0]]);
    const paged: string[] = [];
    for await (const { id } of till.stripe.checkout.sessions.list({ limit: 1 })) paged.push(id);
    expect(paged).toEqual([...made].reverse());
  });

  it('knows the customer it was opened for', async () => {
    const customer = await till.stripe.customers.create({ email: 'ada@example.org', metadata: { 0: 'zero' } });
    expect(await till.stripe.customers.retrieve(customer.id)).toMatchObject({ metadata: { 0: 'zero' } });
    const session = await till.stripe.checkout.sessions.create(anOrder({ customer: customer.id }));
    expect(session).toMatchObject({ customer: customer.id, customer_details: { email: 'ada@example.org' } });
    await till.fake.pay(session.id, { email: 'not asked for' });
    expect((await till.stripe.paymentIntents.list({ customer: customer.id })).data).toHaveLength(1);
  });
});

describe('a refund', () => {
  it('gives part of the money back, then the rest, and never more than was paid', async () => {
    const session = await paidSession();
    const charge = chargeOf(session);
    const part = await till.stripe.refunds.create({ charge: charge.id, amount: 690, reason: 'requested_by_customer' });
    expect(part).toMatchObject({ amount: 690, status: 'succeeded', charge: charge.id });
    const tooMuch = till.stripe.refunds.create({ charge: charge.id, amount: 9301 });
    await expect(tooMuch).rejects.toMatchObject({
      type: 'StripeInvalidRequestError',
      param: 'amount',
      statusCode: 400,
    });
    await expect(tooMuch).rejects.toThrow('€93.01');

    const intent = typeof charge.payment_intent === 'string' ? charge.payment_intent : '';
    await till.stripe.refunds.create({ payment_intent: intent });
    const again = till.stripe.refunds.create({ charge: charge.id });
    await expect(again).rejects.toMatchObject({ code: 'charge_already_refunded' });

    const after = await till.stripe.charges.retrieve(charge.id, { expand: ['refunds'] });
    expect(after).toMatchObject({ amount_refunded: 9990, refunded: true });
    expect(after.refunds?.data.map(({ amount }) => amount)).toEqual([9300, 690]);
    expect((await till.stripe.refunds.list({ charge: charge.id })).data).toHaveLength(2);
    const sums = till.fake.events('charge.refunded').map((event) => event.data.object);
    expect(sums).toMatchObject([{ amount_refunded: 690 }, { amount_refunded: 9990 }]);
    const money = await till.stripe.balanceTransactions.list();
    expect(money.data.reduce((sum, { amount }) => sum + amount, 0)).toBe(0);
  });
});

describe('an error', () => {
  it('of the caller has the shape the SDK reads: type, code, parameter and status', async () => {
    const { stripe } = till;
    await expect(stripe.checkout.sessions.retrieve('cs_test_none')).rejects.toMatchObject({
      type: 'StripeInvalidRequestError',
      code: 'resource_missing',
      param: 'id',
      statusCode: 404,
      doc_url: expect.stringContaining('resource-missing'),
      requestId: expect.stringMatching(/^req_/),
    });
    await expect(stripe.checkout.sessions.create({ ...anOrder(), success_url: '' })).rejects.toMatchObject({
      param: 'success_url',
    });
    const { line_items: _, ...without } = anOrder();
    await expect(stripe.checkout.sessions.create(without)).rejects.toMatchObject({
      code: 'parameter_missing',
      param: 'line_items',
      statusCode: 400,
    });
    const unknown = { ...anOrder(), parcel: 'small' };
    await expect(stripe.checkout.sessions.create(unknown)).rejects.toMatchObject({
      code: 'parameter_unknown',
      param: 'parcel',
    });
    const half = anOrder({
      line_items: [{ quantity: 1, price_data: { currency: 'eur', unit_amount: 4.5, product_data: { name: 'Kit' } } }],
    });
    await expect(stripe.checkout.sessions.create(half)).rejects.toMatchObject({
      code: 'parameter_invalid_integer',
      param: 'line_items[0][price_data][unit_amount]',
    });
    await expect(stripe.checkout.sessions.create(anOrder({ customer: 'cus_none' }))).rejects.toMatchObject({
      code: 'resource_missing',
      param: 'customer',
      statusCode: 400,
    });
    await expect(stripe.checkout.sessions.create(anOrder({ automatic_tax: { enabled: true } }))).rejects.toThrow(
      'does not play',
    );
    await expect(stripe.products.list()).rejects.toMatchObject({ statusCode: 404 });
    await expect(stripe.charges.retrieve('ch_none', { expand: ['nothing'] })).rejects.toMatchObject({
      statusCode: 404,
    });
  });

  it('for a wrong key is 401 and does not print the key', async () => {
    const foreign = new Stripe('sk_live_0123456789abcdef', { ...till.fake.sdk, maxNetworkRetries: 0 });
    const refused = foreign.customers.retrieve('cus_1');
    await expect(refused).rejects.toMatchObject({ type: 'StripeAuthenticationError', statusCode: 401 });
    await expect(refused).rejects.toThrow(/sk_live_\*+cdef/);
  });
});

it('a restart with a state file keeps sessions, payments and the clock', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'stand-in-'));
  const stateFile = join(folder, 'state.json');
  const before = await openTill({ stateFile });
  const { id } = await before.stripe.checkout.sessions.create(anOrder(), { idempotencyKey: 'order-17-1' });
  await before.fake.pay(id);
  const { id: open } = await before.stripe.checkout.sessions.create(anOrder());
  await before.fake.settled();
  before.fake.advance(60_000);
  const ahead = before.fake.now() - Date.now();
  await before.close();

  const after = await openTill({ stateFile });
  expect(after.fake.now() - Date.now()).toBeGreaterThan(ahead - 5000);
  expect(await after.stripe.checkout.sessions.retrieve(id)).toMatchObject({ payment_status: 'paid' });
  const replayed = await sdkFor(after.fake).checkout.sessions.create(anOrder(), { idempotencyKey: 'order-17-1' });
  expect(replayed.id).toBe(id);
  after.fake.advance(25 * 3600_000);
  expect((await after.stripe.checkout.sessions.retrieve(open)).status).toBe('expired');
  await after.close();
  rmSync(folder, { recursive: true });
});
