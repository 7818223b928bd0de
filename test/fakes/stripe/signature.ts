import Stripe from 'stripe';
import type { DeliverOptions } from './deliveries';

/**
 * Body and header as the provider sends them. The signature is dated by the machine's clock, not by the stand-in's own:
 * the receiver compares it with its own time.
 */
export function signed(event: Stripe.EventBase, secrets: readonly string[], options: DeliverOptions) {
  const plain = JSON.stringify(event, null, 2);
  const payload = options.alter ? options.alter(plain) : plain;
  const timestamp = Math.floor(Date.now() / 1000) - (options.ageSeconds ?? 0);
  const headers = (options.secret ? [options.secret] : secrets).map((secret) =>
    Stripe.webhooks.generateTestHeaderString({ payload, secret, timestamp }),
  );
  const signature = [`t=${timestamp}`, ...headers.map((header) => header.split(',')[1])].join();
  return {
    body: options.tamper ? options.tamper(payload) : payload,
    signature: options.unsigned ? undefined : signature,
  };
}
