import Stripe from 'stripe';
import { paymentsOf } from '../orders';
import { reading } from '../record';
import { stripe } from './client';

/** Asks the provider to pay a cancelled order's money back: one refund, however often it is asked. */
export async function payBack(orderId: string): Promise<void> {
  for (const { reference } of await paymentsOf(reading(), orderId)) {
    const key = `refund-${orderId}-${reference}`;
    try {
      await refund(orderId, reference, key);
    } catch (error) {
      // A 500 is repeated under its key for a day. The provider pays no charge back twice, so another key is safe.
      if (!(error instanceof Stripe.errors.StripeAPIError) || error.statusCode !== 500) throw error;
      await refund(orderId, reference, `${key}-again`);
    }
  }
}

async function refund(orderId: string, reference: string, idempotencyKey: string): Promise<void> {
  try {
    await stripe().refunds.create({ payment_intent: reference, metadata: { order_id: orderId } }, { idempotencyKey });
  } catch (error) {
    if (!(error instanceof Stripe.errors.StripeError) || error.code !== 'charge_already_refunded') throw error;
  }
}
