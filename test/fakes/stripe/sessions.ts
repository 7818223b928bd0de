import type Stripe from 'stripe';
import { invalidRequest, noSuch } from './errors';
import { announce } from './events';
import type { SessionInput } from './api/session-input';
import { aCheckoutSession } from './objects/checkout-session';
import { aLine } from './objects/line-item';
import { MAX_EXPIRY_SECONDS } from './options';
import type { SessionRecord } from './store';
import type { World } from './world';

/** Least amount the provider takes by card, in minor units. */
const LEAST_AMOUNT: Readonly<Record<string, number>> = { gbp: 30, jpy: 50 };
const LEAST_AMOUNT_ELSEWHERE = 50;

export function createSession(world: World, input: SessionInput): Stripe.Checkout.Session {
  const created = world.clock.seconds();
  const currency = oneCurrency(input);
  const customer = customerOf(world, input);
  const made = input.line_items.map((line) => aLine(line, created));
  const session = aCheckoutSession({
    input,
    lines: made.map(({ line }) => line),
    currency,
    created,
    expiresAt: expiryOf(world, input, created),
    customer,
    origin: world.origin,
  });
  if ((session.amount_total ?? 0) < (LEAST_AMOUNT[currency] ?? LEAST_AMOUNT_ELSEWHERE)) {
    throw invalidRequest('The total amount due is below the least amount that can be charged.', {
      code: 'amount_too_small',
    });
  }
  for (const { product } of made) world.store.shelves.products.set(product.id, product);
  const intended = input.payment_intent_data;
  const record: SessionRecord = {
    id: session.id,
    session,
    lines: made.map(({ line }) => line),
    forIntent: {
      description: intended?.description ?? null,
      metadata: intended?.metadata ?? {},
      receipt_email: intended?.receipt_email ?? null,
      statement_descriptor: intended?.statement_descriptor ?? null,
    },
    attempt: null,
  };
  world.store.shelves.sessions.set(session.id, record);
  watchExpiry(world, record);
  return session;
}

export function sessionRecord(world: World, id: string): SessionRecord {
  const record = world.store.shelves.sessions.get(id);
  if (!record) throw noSuch('checkout.session', id);
  return record;
}

export function expireSession(world: World, record: SessionRecord): Stripe.Checkout.Session {
  const { session } = record;
  if (session.status !== 'open') {
    throw invalidRequest(
      `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of \`${session.status}\`.`,
    );
  }
  session.status = 'expired';
  session.url = null;
  record.attempt = null;
  const intent = world.store.shelves.intents.get(String(session.payment_intent));
  if (intent) {
    intent.status = 'canceled';
    intent.canceled_at = world.clock.seconds();
    intent.cancellation_reason = 'expired';
    intent.next_action = null;
  }
  announce(world, 'checkout.session.expired', session);
  return session;
}

/** Also called for each open session after a restart. */
export function watchExpiry(world: World, record: SessionRecord): void {
  world.clock.at(record.session.expires_at * 1000, () => {
    if (world.store.shelves.sessions.get(record.id) === record && record.session.status === 'open') {
      expireSession(world, record);
    }
  });
}

function expiryOf(world: World, input: SessionInput, created: number): number {
  const asked = input.expires_at ?? created + MAX_EXPIRY_SECONDS;
  const param = 'expires_at';
  // A caller that counts from its own clock may stand a second before or after this one.
  if (asked < created + world.settings.minExpirySeconds - 1) {
    const least = world.settings.minExpirySeconds;
    throw invalidRequest(`The \`expires_at\` timestamp must be at least ${least} seconds from session creation.`, {
      param,
    });
  }
  if (asked > created + MAX_EXPIRY_SECONDS + 1) {
    throw invalidRequest('The `expires_at` timestamp must be less than 24 hours from session creation.', { param });
  }
  return asked;
}

function oneCurrency(input: SessionInput): string {
  const [first, ...others] = new Set(input.line_items.map((line) => line.price_data.currency));
  if (others.length > 0) {
    throw invalidRequest('All line items must have the same currency.', { param: 'line_items' });
  }
  if (input.currency && input.currency !== first) {
    throw invalidRequest('The currency of the session and of its line items must be the same.', { param: 'currency' });
  }
  return first ?? '';
}

function customerOf(world: World, input: SessionInput): Stripe.Customer | undefined {
  if (input.customer === undefined) return undefined;
  if (input.customer_email !== undefined) {
    throw invalidRequest('You may only specify one of these parameters: customer, customer_email.', {
      param: 'customer',
    });
  }
  if (input.customer_creation !== undefined) {
    throw invalidRequest('You may only specify one of these parameters: customer, customer_creation.', {
      param: 'customer',
    });
  }
  const customer = world.store.shelves.customers.get(input.customer);
  if (!customer) throw noSuch('customer', input.customer, 'customer');
  return customer;
}
