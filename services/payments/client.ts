import Stripe from 'stripe';
import { env } from '../env';

/** The version of the provider's API that this code was written for; the endpoint of its events is set to the same. */
export const apiVersion = '2026-10-28.endive';

let client: Stripe | undefined;

/** The provider's SDK, made once. STRIPE_API_HOST points it at a stand-in. */
export function stripe(): Stripe {
  client ??= new Stripe(env().STRIPE_SECRET_KEY, {
    apiVersion,
    maxNetworkRetries: 2,
    timeout: 10_000,
    telemetry: false,
    ...standIn(env().STRIPE_API_HOST),
  });
  return client;
}

function standIn(address: string | undefined): Pick<Stripe.StripeConfig, 'host' | 'port' | 'protocol'> {
  if (address === undefined) return {};
  const [host = '', port = ''] = address.split(':');
  return { host, port, protocol: 'http' };
}

/** For tests, whose stand-in listens on a port of its own. */
export function useStripe(next: Stripe | undefined): void {
  client = next;
}
