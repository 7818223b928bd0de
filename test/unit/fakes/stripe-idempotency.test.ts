import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { anOrder, openTill, sdkFor, type Till } from './till';

let till: Till;
beforeEach(async () => {
  till = await openTill();
});
afterEach(() => till.close());

const openSessions = async () => (await till.stripe.checkout.sessions.list()).data;
const key = (idempotencyKey: string) => ({ idempotencyKey });

describe('an idempotency key', () => {
  it('gives the first answer again and makes nothing new', async () => {
    const first = await till.stripe.checkout.sessions.create(anOrder(), key('order-17-1'));
    const second = await till.stripe.checkout.sessions.create(anOrder(), key('order-17-1'));
    expect(second.id).toBe(first.id);
    expect(second.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(second.lastResponse.headers['original-request']).toBe(first.lastResponse.requestId);
    expect(first.lastResponse.headers['idempotent-replayed']).toBeUndefined();
    expect(await openSessions()).toHaveLength(1);
  });

  it('is refused for other parameters and for another address', async () => {
    const { id } = await till.stripe.checkout.sessions.create(anOrder(), key('order-17-1'));
    const other = till.stripe.checkout.sessions.create(anOrder({ client_reference_id: 'order-18' }), key('order-17-1'));
    await expect(other).rejects.toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
    await expect(other).rejects.toMatchObject({ statusCode: 400, rawType: 'idempotency_error' });
    const elsewhere = till.stripe.checkout.sessions.expire(id, {}, key('order-17-1'));
    await expect(elsewhere).rejects.toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
    expect(await openSessions()).toMatchObject([{ id, status: 'open' }]);
  });

  it('in use by a request still under way answers 409', async () => {
    till.fake.set({ apiDelayMs: 150 });
    const both = await Promise.allSettled([
      till.stripe.checkout.sessions.create(anOrder(), key('order-17-1')),
      till.stripe.checkout.sessions.create(anOrder(), key('order-17-1')),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    const refused = both.find((one) => one.status === 'rejected');
    expect(refused?.reason).toMatchObject({ statusCode: 409, code: 'idempotency_key_in_use' });
    till.fake.set({ apiDelayMs: 0 });
    expect(await openSessions()).toHaveLength(1);
  });

  it('replays even a 500, so that only a new key gets further', async () => {
    till.fake.fail('error-500');
    await expect(till.stripe.checkout.sessions.create(anOrder(), key('one'))).rejects.toMatchObject({
      statusCode: 500,
    });
    await expect(till.stripe.checkout.sessions.create(anOrder(), key('one'))).rejects.toMatchObject({
      statusCode: 500,
    });
    expect(till.fake.calls().map(({ replayed }) => replayed)).toEqual([false, true]);
    expect((await till.stripe.checkout.sessions.create(anOrder(), key('two'))).status).toBe('open');
  });

  it('remembers neither wrong parameters nor an outage nor a rate limit', async () => {
    const wrong = anOrder({ expires_at: -1, success_url: 'no address' });
    await expect(till.stripe.checkout.sessions.create(wrong, key('one'))).rejects.toMatchObject({
      code: 'url_invalid',
    });
    till.fake.fail('outage-503');
    await expect(till.stripe.checkout.sessions.create(anOrder(), key('one'))).rejects.toMatchObject({
      statusCode: 503,
    });
    till.fake.fail('rate-limit-429');
    await expect(till.stripe.checkout.sessions.create(anOrder(), key('one'))).rejects.toBeInstanceOf(
      Stripe.errors.StripeRateLimitError,
    );
    expect((await till.stripe.checkout.sessions.create(anOrder(), key('one'))).status).toBe('open');
  });

  it('is free again after a day', async () => {
    const first = await till.stripe.checkout.sessions.create(anOrder(), key('one'));
    till.fake.advance(24 * 3600_000 + 1000);
    expect((await till.stripe.checkout.sessions.create(anOrder(), key('one'))).id).not.toBe(first.id);
  });

  it('has 255 characters at most', async () => {
    await expect(till.stripe.customers.create({}, key('k'.repeat(256)))).rejects.toThrow('255');
    expect((await till.stripe.customers.create({}, key('k'.repeat(255)))).object).toBe('customer');
  });
});

describe('a retrying shop', () => {
  for (const fault of ['reset', 'work-then-reset'] as const) {
    it(`gets exactly one session over ${fault}`, async () => {
      const retrying = sdkFor(till.fake, { maxNetworkRetries: 2 });
      till.fake.fail(fault);
      const session = await retrying.checkout.sessions.create(anOrder(), key('order-17-1'));
      expect((await openSessions()).map(({ id }) => id)).toEqual([session.id]);
    });
  }

  for (const fault of ['silent', 'work-then-silent'] as const) {
    it(`gets exactly one session over ${fault}`, async () => {
      const retrying = sdkFor(till.fake, { maxNetworkRetries: 2, timeout: 200 });
      till.fake.fail(fault, { path: '/v1/checkout/sessions' });
      const session = await retrying.checkout.sessions.create(anOrder(), key('order-17-1'));
      expect((await openSessions()).map(({ id }) => id)).toEqual([session.id]);
    });
  }

  it('whose answer broke off half-way gets the same session by asking again with the key', async () => {
    const retrying = sdkFor(till.fake, { maxNetworkRetries: 2 });
    till.fake.fail('half-body');
    // The SDK does not try again once an answer has begun.
    const cut = retrying.checkout.sessions.create(anOrder(), key('order-17-1'));
    await expect(cut).rejects.toBeInstanceOf(Stripe.errors.StripeConnectionError);
    const session = await retrying.checkout.sessions.create(anOrder(), key('order-17-1'));
    expect((await openSessions()).map(({ id }) => id)).toEqual([session.id]);
  });

  it('reads a page of HTML as an error of the provider', async () => {
    till.fake.fail('wrong-json');
    await expect(till.stripe.customers.create({})).rejects.toBeInstanceOf(Stripe.errors.StripeAPIError);
  });

  it('meets faults only on the path and as often as planned', async () => {
    till.fake.fail('outage-503', { times: 2, path: '/v1/refunds' });
    await till.stripe.customers.create({});
    await expect(till.stripe.refunds.list()).rejects.toMatchObject({ statusCode: 503 });
    await expect(till.stripe.refunds.list()).rejects.toMatchObject({ statusCode: 503 });
    expect((await till.stripe.refunds.list()).data).toEqual([]);
  });
});
