import Stripe from 'stripe';

let made = 0;

export interface Told {
  id: string;
  body: string;
}

/** An event of the provider as text, without its signature. */
export function event(type: string, object: Record<string, unknown>): Told {
  const id = `evt_${(++made).toString().padStart(6, '0')}`;
  const body = JSON.stringify({
    id,
    object: 'event',
    api_version: '2026-10-28.endive',
    created: 1_764_000_000 + made,
    livemode: false,
    pending_webhooks: 1,
    request: null,
    type,
    data: { object },
  });
  return { id, body };
}

export interface SessionFacts {
  orderId: string;
  amount: number;
  attempt?: number;
  status?: 'open' | 'complete' | 'expired';
  paymentStatus?: 'paid' | 'unpaid';
  currency?: string;
  intent?: string;
}

export const session = (facts: SessionFacts): Record<string, unknown> => ({
  id: `cs_test_${facts.orderId}_${facts.attempt ?? 1}`,
  object: 'checkout.session',
  amount_total: facts.amount,
  currency: facts.currency ?? 'gbp',
  metadata: { order_id: facts.orderId, attempt: `${facts.attempt ?? 1}` },
  payment_intent: facts.intent ?? `pi_${facts.orderId}`,
  payment_status: facts.paymentStatus ?? 'paid',
  status: facts.status ?? 'complete',
});

export const charge = (facts: { orderId: string; amount: number; refunded: number }): Record<string, unknown> => ({
  id: `ch_${facts.orderId}`,
  object: 'charge',
  amount: facts.amount,
  amount_refunded: facts.refunded,
  currency: 'gbp',
  metadata: { order_id: facts.orderId, attempt: '1' },
  payment_intent: `pi_${facts.orderId}`,
});

/** The header the provider sends, made by the SDK itself. */
export function signatureOf(payload: string, options: { secret?: string; ageSeconds?: number } = {}): string {
  return Stripe.webhooks.generateTestHeaderString({
    payload,
    secret: options.secret ?? process.env['STRIPE_WEBHOOK_SECRET'] ?? '',
    timestamp: Math.floor(Date.now() / 1000) - (options.ageSeconds ?? 0),
  });
}
