import type Stripe from 'stripe';
import type { TestCard } from './cards';
import { docUrl, invalidRequest, noSuch } from './errors';
import { announce } from './events';
import { newId } from './identifiers';
import { aBalanceTransaction } from './objects/balance-transaction';
import { aCharge, type Refusal } from './objects/charge';
import { detailsOf } from './objects/checkout-session';
import { aCustomer } from './objects/customer';
import { aDispute } from './objects/dispute';
import { aPaymentIntent } from './objects/payment-intent';
import type { SessionRecord } from './store';
import type { World } from './world';

/** Who tries to pay with what; of the card number only the last four digits stay. */
export interface PaymentAttempt {
  email: string | null;
  name: string | null;
  paymentMethod: string;
  card: { brand: TestCard['brand']; last4: string; expMonth: number; expYear: number };
}

export type PaymentAnswer = { kind: 'paid' } | { kind: 'asks' } | { kind: 'refused'; sentence: string };

const AUTHENTICATION_FAILED: Refusal = {
  code: 'payment_intent_authentication_failure',
  sentence: 'Your bank could not confirm that it is you. Nothing was taken. Try again or use another card.',
};
const DEBIT_FAILED: Refusal = {
  code: 'payment_intent_payment_attempt_failed',
  sentence: 'The bank did not send the money.',
};

export function pay(world: World, record: SessionRecord, card: TestCard, attempt: PaymentAttempt): PaymentAnswer {
  const intent = intentOf(world, record);
  record.attempt = null;
  if (card.outcome.kind === 'refused') return refuse(world, intent, attempt, card.outcome);
  if (card.outcome.kind === 'asks') {
    record.attempt = attempt;
    intent.status = 'requires_action';
    const url = `${world.origin}/pay/${record.id}/authenticate`;
    intent.next_action = {
      type: 'redirect_to_url',
      redirect_to_url: { return_url: `${world.origin}/pay/${record.id}`, url },
    };
    return { kind: 'asks' };
  }
  complete(world, record, attempt);
  if (card.outcome.kind === 'disputes') dispute(world, intent.id, 'fraudulent');
  return { kind: 'paid' };
}

/** The card holder's bank has said whether it is really them. */
export function authenticate(world: World, record: SessionRecord, passed: boolean): PaymentAnswer {
  const { attempt } = record;
  if (!attempt) return { kind: 'refused', sentence: 'No payment waits for authentication. Enter the card again.' };
  record.attempt = null;
  if (!passed) return refuse(world, intentOf(world, record), attempt, AUTHENTICATION_FAILED);
  complete(world, record, attempt);
  return { kind: 'paid' };
}

/** How a payment that completed unpaid ends, as with a bank debit some days later. */
export function settle(world: World, sessionId: string, outcome: 'succeeded' | 'failed'): void {
  const record = world.store.shelves.sessions.get(sessionId);
  if (!record?.attempt || record.session.status !== 'complete') {
    throw invalidRequest(`No payment waits to be settled for '${sessionId}'.`);
  }
  const { attempt } = record;
  record.attempt = null;
  if (outcome === 'failed') {
    refuse(world, intentOf(world, record), attempt, DEBIT_FAILED);
    announce(world, 'checkout.session.async_payment_failed', record.session);
    return;
  }
  takeMoney(world, record, attempt);
  announce(world, 'checkout.session.async_payment_succeeded', record.session);
}

export function dispute(world: World, chargeOrIntent: string, reason: string): Stripe.Dispute {
  const { charges, disputes, intents } = world.store.shelves;
  const charge = charges.get(String(intents.get(chargeOrIntent)?.latest_charge ?? chargeOrIntent));
  if (!charge) throw noSuch('charge', chargeOrIntent, 'charge');
  const raised = aDispute(charge, reason, world.clock.seconds());
  charge.disputed = true;
  disputes.set(raised.id, raised);
  announce(world, 'charge.dispute.created', raised);
  return raised;
}

function complete(world: World, record: SessionRecord, attempt: PaymentAttempt): void {
  const { session } = record;
  session.status = 'complete';
  session.url = null;
  session.customer_details = detailsOf(attempt.email, attempt.name);
  const intent = intentOf(world, record);
  if (session.customer_creation === 'always') {
    const customer = aCustomer({ email: attempt.email, name: attempt.name }, world.clock.seconds());
    world.store.shelves.customers.set(customer.id, customer);
    session.customer = customer.id;
    intent.customer = customer.id;
  }
  if (world.switches.settleLateNext > 0) {
    world.switches.settleLateNext -= 1;
    record.attempt = attempt;
    intent.status = 'processing';
    intent.next_action = null;
  } else {
    takeMoney(world, record, attempt);
  }
  announce(world, 'checkout.session.completed', session);
}

function takeMoney(world: World, record: SessionRecord, attempt: PaymentAttempt): void {
  const intent = intentOf(world, record);
  const charge = aCharge(intent, attempt, world.clock.seconds());
  const transaction = aBalanceTransaction('charge', charge, world.clock.seconds());
  charge.balance_transaction = transaction.id;
  world.store.shelves.transactions.set(transaction.id, transaction);
  world.store.shelves.charges.set(charge.id, charge);
  intent.status = 'succeeded';
  intent.amount_received = intent.amount;
  intent.latest_charge = charge.id;
  intent.payment_method = attempt.paymentMethod;
  intent.next_action = null;
  intent.last_payment_error = null;
  record.session.payment_status = 'paid';
  announce(world, 'payment_intent.succeeded', intent);
}

function refuse(world: World, intent: Stripe.PaymentIntent, attempt: PaymentAttempt, refusal: Refusal): PaymentAnswer {
  const charge = aCharge(intent, attempt, world.clock.seconds(), refusal);
  world.store.shelves.charges.set(charge.id, charge);
  intent.status = 'requires_payment_method';
  intent.latest_charge = charge.id;
  intent.next_action = null;
  intent.last_payment_error = {
    charge: charge.id,
    code: refusal.code,
    ...(refusal.declineCode && { decline_code: refusal.declineCode }),
    doc_url: docUrl(refusal.code),
    message: refusal.sentence,
    type: 'card_error',
  };
  announce(world, 'payment_intent.payment_failed', intent);
  return { kind: 'refused', sentence: refusal.sentence };
}

function intentOf(world: World, record: SessionRecord): Stripe.PaymentIntent {
  const { intents } = world.store.shelves;
  const known = intents.get(String(record.session.payment_intent));
  if (known) return known;
  const intent = aPaymentIntent(record, world.clock.seconds());
  intents.set(intent.id, intent);
  record.session.payment_intent = intent.id;
  return intent;
}

export function newAttempt(
  card: TestCard,
  buyer: Pick<PaymentAttempt, 'email' | 'name'>,
  expiry: Expiry,
): PaymentAttempt {
  return {
    ...buyer,
    paymentMethod: newId('pm'),
    card: { brand: card.brand, last4: card.number.slice(-4), expMonth: expiry.month, expYear: expiry.year },
  };
}

export interface Expiry {
  month: number;
  year: number;
}
