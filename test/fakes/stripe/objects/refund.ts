import type Stripe from 'stripe';
import { newId } from '../identifiers';

export interface RefundFacts {
  amount: number;
  reason: Stripe.Refund['reason'];
  metadata: Stripe.Metadata;
}

export function aRefund(charge: Stripe.Charge, facts: RefundFacts, created: number): Stripe.Refund {
  return {
    id: newId('re'),
    object: 'refund',
    amount: facts.amount,
    balance_transaction: null,
    charge: charge.id,
    created,
    currency: charge.currency,
    customer: charge.customer,
    customer_account: null,
    destination_details: {
      card: { type: 'refund', reference_status: 'pending', reference_type: 'acquirer_reference_number' },
      type: 'card',
    },
    metadata: facts.metadata,
    payment_intent: charge.payment_intent,
    payment_method: charge.payment_method,
    reason: facts.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  };
}
