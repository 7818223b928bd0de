import Stripe from 'stripe';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { anOrder, chargeOf, openTill, paidSession, type Till } from './till';

let till: Till;
beforeEach(async () => {
  till = await openTill();
});
afterEach(() => till.close());

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
    const charge = chargeOf(await paidSession(till));
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
    const charge = chargeOf(await paidSession(till));
    till.fake.dispute(charge.id);
    await till.fake.settled();
    const disputed = till.endpoint.events().find((event) => event.type === 'charge.dispute.created');
    expect(disputed?.data.object).toMatchObject({ charge: charge.id, amount: 9990, reason: 'fraudulent' });
    expect(await till.stripe.charges.retrieve(charge.id)).toMatchObject({ disputed: true });
  });
});

describe('a refund', () => {
  it('gives part of the money back, then the rest, and never more than was paid', async () => {
    const session = await paidSession(till);
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
