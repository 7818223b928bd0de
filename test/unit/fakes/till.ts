import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import type { FakeStripeOptions } from '../../fakes/stripe/options';
import { startFakeStripe, type FakeStripe } from '../../fakes/stripe/start';

export const SECRET = 'whsec_for_these_tests';

interface Arrival {
  body: string;
  signature: string | undefined;
}

/** An endpoint that notes what arrives and answers as told: one status a delivery, then 200. */
class Endpoint {
  readonly arrivals: Arrival[] = [];
  answers: number[] = [];

  private constructor(
    private readonly server: Server,
    readonly url: string,
  ) {}

  static async open(): Promise<Endpoint> {
    const server = createServer((request, response) => {
      let body = '';
      request.on('data', (chunk: Buffer) => (body += chunk.toString('utf8')));
      request.on('end', () => {
        const signature = request.headers['stripe-signature'];
        endpoint.arrivals.push({ body, signature: typeof signature === 'string' ? signature : undefined });
        response.writeHead(endpoint.answers.shift() ?? 200).end();
      });
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const endpoint = new Endpoint(server, `http://127.0.0.1:${portOf(server.address())}/hook`);
    return endpoint;
  }

  /** Only events whose signature the SDK accepts get through. */
  events(): Stripe.Event[] {
    return this.arrivals.map(({ body, signature }) => Stripe.webhooks.constructEvent(body, signature ?? '', SECRET));
  }

  types(): string[] {
    return this.events().map((event) => event.type);
  }

  async close(): Promise<void> {
    const closed = new Promise((resolve) => this.server.close(resolve));
    this.server.closeAllConnections();
    await closed;
  }
}

export interface Till {
  fake: FakeStripe;
  endpoint: Endpoint;
  stripe: Stripe;
  close(): Promise<void>;
}

export async function openTill(options: FakeStripeOptions = {}): Promise<Till> {
  const endpoint = await Endpoint.open();
  const fake = await startFakeStripe({ webhook: endpoint.url, secret: SECRET, ...options });
  const stripe = sdkFor(fake);
  return {
    fake,
    endpoint,
    stripe,
    close: async () => {
      await fake.close();
      await endpoint.close();
    },
  };
}

export function sdkFor(fake: FakeStripe, config: Partial<ConstructorParameters<typeof Stripe>[1]> = {}): Stripe {
  return new Stripe('sk_test_of_the_shop', {
    ...fake.sdk,
    maxNetworkRetries: 0,
    telemetry: false,
    timeout: 2000,
    ...config,
  });
}

type Asked = Stripe.Checkout.SessionCreateParams;

/** Two kits and their postage: 2 × 46.50 and 6.90 euro. */
export function anOrder(changes: Partial<Asked> = {}): Asked {
  return {
    mode: 'payment',
    success_url: 'http://127.0.0.1:3000/orders/17?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://127.0.0.1:3000/basket',
    client_reference_id: 'order-17',
    metadata: { order: 'order-17' },
    line_items: [
      { quantity: 2, price_data: { currency: 'eur', unit_amount: 4650, product_data: { name: 'Kit 7 B' } } },
      { quantity: 1, price_data: { currency: 'eur', unit_amount: 690, product_data: { name: 'Postage' } } },
    ],
    ...changes,
  };
}

function portOf(address: AddressInfo | string | null): number {
  if (address === null || typeof address === 'string') throw new Error('no port');
  return address.port;
}

export async function paidSession({ fake, stripe }: Till): Promise<Stripe.Checkout.Session> {
  const { id } = await stripe.checkout.sessions.create(anOrder());
  await fake.pay(id);
  await fake.settled();
  return stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent.latest_charge'] });
}

export function chargeOf(session: Stripe.Checkout.Session): Stripe.Charge {
  const intent = session.payment_intent;
  if (intent === null || typeof intent === 'string') throw new Error('payment intent not expanded');
  if (intent.latest_charge === null || typeof intent.latest_charge === 'string') throw new Error('charge not expanded');
  return intent.latest_charge;
}
