import type Stripe from 'stripe';
import { invalidRequest, noSuch } from './errors';
import { announce } from './events';
import { formatMoney } from './money';
import { aBalanceTransaction } from './objects/balance-transaction';
import { aRefund } from './objects/refund';
import type { World } from './world';

interface RefundInput {
  amount?: number | undefined;
  charge?: string | undefined;
  payment_intent?: string | undefined;
  reason?: Stripe.Refund['reason'] | undefined;
  metadata?: Stripe.Metadata | undefined;
}

export function createRefund(world: World, input: RefundInput): Stripe.Refund {
  const charge = chargeToRefund(world, input);
  const left = charge.amount - charge.amount_refunded;
  const amount = input.amount ?? left;
  if (left === 0) {
    throw invalidRequest(`Charge ${charge.id} has already been refunded.`, { code: 'charge_already_refunded' });
  }
  if (charge.disputed) {
    throw invalidRequest(`Charge ${charge.id} has been charged back and cannot be refunded.`, {
      code: 'charge_disputed',
    });
  }
  if (amount > left) {
    const [asked, rest] = [amount, left].map((value) => formatMoney(value, charge.currency));
    const of = charge.amount_refunded === 0 ? 'charge amount' : 'unrefunded amount on charge';
    throw invalidRequest(`Refund amount (${asked}) is greater than ${of} (${rest})`, { param: 'amount' });
  }
  return book(
    world,
    charge,
    aRefund(charge, { amount, reason: input.reason ?? null, metadata: input.metadata ?? {} }, world.clock.seconds()),
  );
}

function book(world: World, charge: Stripe.Charge, refund: Stripe.Refund): Stripe.Refund {
  const { refunds, transactions } = world.store.shelves;
  const transaction = aBalanceTransaction('refund', refund, refund.created);
  refund.balance_transaction = transaction.id;
  transactions.set(transaction.id, transaction);
  refunds.set(refund.id, refund);
  charge.amount_refunded += refund.amount;
  charge.refunded = charge.amount_refunded === charge.amount;
  announce(world, 'charge.refunded', charge);
  return refund;
}

function chargeToRefund(world: World, input: RefundInput): Stripe.Charge {
  const { charges, intents } = world.store.shelves;
  if (input.charge !== undefined && input.payment_intent !== undefined) {
    throw invalidRequest('You may only specify one of these parameters: charge, payment_intent.');
  }
  if (input.payment_intent !== undefined) {
    const intent = intents.get(input.payment_intent);
    if (!intent) throw noSuch('payment_intent', input.payment_intent, 'payment_intent');
    const charge = charges.get(String(intent.latest_charge));
    if (charge?.paid) return charge;
    throw invalidRequest('This PaymentIntent does not have a successful charge to refund.', {
      param: 'payment_intent',
    });
  }
  if (input.charge === undefined) {
    throw invalidRequest('One of the following params should be provided for this request: payment_intent or charge.');
  }
  const charge = charges.get(input.charge);
  if (!charge) throw noSuch('charge', input.charge, 'charge');
  if (!charge.paid) throw invalidRequest('A failed charge cannot be refunded.', { param: 'charge' });
  return charge;
}
