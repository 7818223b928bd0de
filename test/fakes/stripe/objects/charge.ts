import type Stripe from 'stripe';
import { newId } from '../identifiers';
import type { PaymentAttempt } from '../payments';

export interface Refusal {
  code: string;
  declineCode?: string;
  sentence: string;
}

/** One try at taking the money: succeeded, or refused with the reason the bank gives. */
export function aCharge(
  intent: Stripe.PaymentIntent,
  attempt: PaymentAttempt,
  created: number,
  refusal?: Refusal,
): Stripe.Charge {
  return {
    id: newId('ch'),
    object: 'charge',
    amount: intent.amount,
    amount_captured: refusal ? 0 : intent.amount,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: { address: null, email: attempt.email, name: attempt.name, phone: null, tax_id: null },
    calculated_statement_descriptor: intent.statement_descriptor,
    captured: !refusal,
    created,
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: refusal?.code ?? null,
    failure_message: refusal?.sentence ?? null,
    fraud_details: {},
    livemode: false,
    metadata: { ...intent.metadata },
    on_behalf_of: null,
    outcome: outcomeOf(refusal),
    paid: !refusal,
    payment_intent: intent.id,
    payment_method: attempt.paymentMethod,
    payment_method_details: { card: cardDetails(intent, attempt, refusal), type: 'card' },
    receipt_email: intent.receipt_email,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: intent.statement_descriptor,
    statement_descriptor_suffix: null,
    status: refusal ? 'failed' : 'succeeded',
    transfer_data: null,
    transfer_group: null,
  };
}

function outcomeOf(refusal: Refusal | undefined): Stripe.Charge.Outcome {
  return {
    advice_code: refusal ? 'try_again_later' : null,
    network_advice_code: null,
    network_decline_code: null,
    network_status: refusal ? 'declined_by_network' : 'approved_by_network',
    reason: refusal ? (refusal.declineCode ?? refusal.code) : null,
    risk_level: 'normal',
    risk_score: 10,
    seller_message: refusal ? refusal.sentence : 'Payment complete.',
    type: refusal ? 'issuer_declined' : 'authorized',
  };
}

function cardDetails(
  intent: Stripe.PaymentIntent,
  attempt: PaymentAttempt,
  refusal: Refusal | undefined,
): Stripe.Charge.PaymentMethodDetails.Card {
  const { brand, last4, expMonth, expYear } = attempt.card;
  return {
    amount_authorized: refusal ? null : intent.amount,
    authorization_code: null,
    brand,
    checks: {
      address_line1_check: null,
      address_postal_code_check: null,
      cvc_check: refusal?.code === 'incorrect_cvc' ? 'fail' : 'pass',
    },
    country: 'DE',
    electronic_commerce_indicator: null,
    exp_month: expMonth,
    exp_year: expYear,
    funding: 'credit',
    installments: null,
    last4,
    mandate: null,
    network: brand,
    network_transaction_id: null,
    regulated_status: 'unregulated',
    three_d_secure: null,
    transaction_link_id: null,
    wallet: null,
  };
}
