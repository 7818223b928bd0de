import type Stripe from 'stripe';
import type { PaymentAttempt } from '../orders';
import { orderLink } from '../orders';
import { minutes } from '../time';
import { stripe } from './client';

/** The payment page closes before the stock is given back, so that nobody pays for what is gone. */
const closesBefore = minutes(2);

/** Asks for the payment page of one try. The key is made from our row: asked twice, it is one page. */
export async function openSession(payment: PaymentAttempt): Promise<{ id: string; url: string }> {
  const { orderId, number, attempt, email, lines, delivery, keptUntil } = payment;
  const link = orderLink(orderId);
  const metadata = { order_id: orderId, attempt: attempt.toString() };
  const items = lines.map(({ name, unit, quantity }) => lineItem(name, unit, quantity));
  const session = await stripe().checkout.sessions.create(
    {
      mode: 'payment',
      allowed_payment_method_types: ['card'],
      client_reference_id: number,
      customer_email: email,
      line_items: delivery.price.minor > 0 ? [...items, lineItem(delivery.name, delivery.price, 1)] : items,
      metadata,
      payment_intent_data: { metadata, description: `Order ${number}` },
      expires_at: Math.floor((keptUntil - closesBefore) / 1000),
      success_url: `${link}&back=paid`,
      cancel_url: `${link}&back=unpaid`,
    },
    { idempotencyKey: `checkout-${orderId}-${attempt}` },
  );
  if (!session.url) throw new Error(`Session ${session.id} has no address.`);
  return { id: session.id, url: session.url };
}

function lineItem(
  name: string,
  unit: PaymentAttempt['total'],
  quantity: number,
): Stripe.Checkout.SessionCreateParams.LineItem {
  return {
    quantity,
    price_data: { currency: unit.currency.toLowerCase(), unit_amount: unit.minor, product_data: { name } },
  };
}
