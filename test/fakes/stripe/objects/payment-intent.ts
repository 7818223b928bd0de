import type Stripe from 'stripe';
import { newId } from '../identifiers';
import type { SessionRecord } from '../store';

export function aPaymentIntent({ session, forIntent }: SessionRecord, created: number): Stripe.PaymentIntent {
  const id = newId('pi');
  return {
    id,
    object: 'payment_intent',
    allowed_payment_method_types: null,
    amount: session.amount_total ?? 0,
    amount_capturable: 0,
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: `${id}_secret_${newId('x', 22).slice(2)}`,
    confirmation_method: 'automatic',
    created,
    currency: session.currency ?? '',
    customer: session.customer,
    customer_account: null,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: null,
    payment_method_types: session.payment_method_types,
    payment_record: null,
    processing: null,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_data: null,
    transfer_group: null,
    ...forIntent,
  };
}
