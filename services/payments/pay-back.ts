import Stripe from 'stripe';
import { paymentsOf } from '../orders';
import { reading } from '../record';
import { stripe } from './client';

/** Asks the provider to pay a cancelled order's money back. The key makes it one refund, however often it is asked. */
export async function payBack(orderId: string): Promise<void> {
  for (const { reference } of await paymentsOf(reading(), orderId)) {
    try {
      await stripe().refunds.create(
        { payment_intent: reference, metadata: { order_id: orderId } },
        { idempotencyKey: `refund-${orderId}-${reference}` },
      );
    } catch (error) {
      // Keys are forgotten after a day; what went back before that is told by this code.
      if (!(error instanceof Stripe.errors.StripeError) || error.code !== 'charge_already_refunded') throw error;
    }
  }
}
