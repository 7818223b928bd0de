import type Stripe from 'stripe';
import { newId } from '../identifiers';

/** A usual card fee in Europe, 1.5 % and 25 minor units; only its shape matters to the shop. */
const FEE_PER_THOUSAND = 15;
const FEE_FIXED = 25;
const UNTIL_AVAILABLE_SECONDS = 2 * 24 * 60 * 60;

export function aBalanceTransaction(
  kind: 'charge' | 'refund',
  source: Stripe.Charge | Stripe.Refund,
  created: number,
): Stripe.BalanceTransaction {
  const amount = kind === 'charge' ? source.amount : -source.amount;
  const fee = kind === 'charge' ? Math.round((amount * FEE_PER_THOUSAND) / 1000) + FEE_FIXED : 0;
  return {
    id: newId('txn'),
    object: 'balance_transaction',
    amount,
    available_on: created + UNTIL_AVAILABLE_SECONDS,
    balance_type: 'payments',
    created,
    currency: source.currency,
    description: source.description ?? null,
    exchange_rate: null,
    fee,
    fee_details:
      fee === 0
        ? []
        : [
            {
              amount: fee,
              application: null,
              currency: source.currency,
              description: 'Processing fee',
              type: 'stripe_fee',
            },
          ],
    net: amount - fee,
    reporting_category: kind,
    source: source.id,
    status: 'pending',
    type: kind,
  };
}
