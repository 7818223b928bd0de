import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { anOrder, openTill, paidSession, sdkFor, type Till } from './till';

let till: Till;
beforeEach(async () => {
  till = await openTill();
});
afterEach(() => till.close());

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
    const paid = await paidSession(till);
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
