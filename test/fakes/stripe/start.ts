import type { AddressInfo } from 'node:net';
import type Stripe from 'stripe';
import type { Call } from './api/answer';
import { Clock } from './clock';
import { reset, setSwitches } from './control';
import { Deliveries, type Delivery, type DeliverOptions } from './deliveries';
import { announce, type EventType, type ObjectOf } from './events';
import { settingsOf, type FakeStripeOptions } from './options';
import { payByForm, type PayOptions, type PayResult } from './pay';
import { dispute, settle } from './payments';
import { makeServer } from './server';
import { watchExpiry } from './sessions';
import { Store } from './store';
import { allOff, FaultPlan, type ApiFault, type Switches } from './switches';
import type { World } from './world';

export interface FakeStripe {
  url: string;
  port: number;
  /** The secrets events are signed with, the first one first. */
  secrets: string[];
  /** For `new Stripe(key, { ...fake.sdk })`. */
  sdk: { host: string; port: number; protocol: 'http' };
  pay(sessionId: string, options?: PayOptions): Promise<PayResult>;
  settle(sessionId: string, outcome: 'succeeded' | 'failed'): void;
  dispute(chargeOrIntent: string, reason?: string): Stripe.Dispute;
  /** Sends any event the SDK knows, about any object of its kind. */
  announce: <T extends EventType>(type: T, object: ObjectOf<T>) => Stripe.EventBase;
  set(switches: Partial<Switches>): void;
  fail(fault: ApiFault, options?: { times?: number; path?: string }): void;
  /** One more delivery of an event, if need be aged, altered, wrongly signed or unsigned. */
  deliver(eventId: string, options?: DeliverOptions): Promise<{ status: number; body: string }>;
  deliveries(): Delivery[];
  events(type?: EventType): Stripe.EventBase[];
  /** Every API call that arrived, oldest first. */
  calls(): Call[];
  /** When nothing waits to be delivered; held and dropped events do not count. */
  settled(): Promise<void>;
  now(): number;
  advance(ms: number): void;
  reset(): void;
  /** Where events go from now on, for an endpoint that starts later. */
  sendTo(webhook: string): void;
  close(): Promise<void>;
}

export async function startFakeStripe(options: FakeStripeOptions = {}): Promise<FakeStripe> {
  const settings = settingsOf(options);
  const store = new Store();
  const clock = new Clock(settings.stateFile ? store.load(settings.stateFile) : 0);
  const ground = {
    settings,
    clock,
    store,
    switches: allOff(),
    save: () => {
      if (settings.stateFile) store.save(settings.stateFile, clock.ahead);
    },
  };
  const world: World = { ...ground, faults: new FaultPlan(), deliveries: new Deliveries(ground), origin: '' };
  const calls: Call[] = [];
  const server = makeServer(world, calls);
  const host = options.host ?? '127.0.0.1';
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port ?? 0, host, resolve);
  });
  const port = portOf(server.address());
  const url = `http://${host}:${port}`;
  world.origin = (options.publicUrl ?? url).replace(/\/$/, '');
  for (const record of store.shelves.sessions.values())
    if (record.session.status === 'open') watchExpiry(world, record);
  world.deliveries.resume();

  /** A deed from outside the HTTP door, kept like any other. */
  const kept = <T>(deed: () => T): T => {
    const result = deed();
    world.save();
    return result;
  };
  return {
    url,
    port,
    secrets: settings.secrets,
    sdk: { host, port, protocol: 'http' },
    pay: (sessionId, how) => payByForm(`${url}/pay/${sessionId}`, how),
    settle: (sessionId, outcome) => kept(() => settle(world, sessionId, outcome)),
    dispute: (payment, reason = 'fraudulent') => kept(() => dispute(world, payment, reason)),
    announce: (type, object) => kept(() => announce(world, type, object)),
    set: (switches) => setSwitches(world, switches),
    fail: (fault, { times = 1, path } = {}) => world.faults.add({ fault, times, path }),
    deliver: (eventId, how) => world.deliveries.again(eventId, how),
    deliveries: () => world.deliveries.list(),
    events: (type) => [...store.shelves.events.values()].filter((event) => type === undefined || event.type === type),
    calls: () => [...calls],
    settled: () => world.deliveries.settled(),
    now: () => clock.now(),
    advance: (ms) => kept(() => clock.advance(ms)),
    reset: () => {
      calls.length = 0;
      kept(() => reset(world));
    },
    sendTo: (webhook) => {
      settings.webhook = webhook;
    },
    close: async () => {
      clock.stop();
      world.deliveries.stop();
      const closed = new Promise((resolve) => server.close(resolve));
      server.closeAllConnections();
      await closed;
    },
  };
}

function portOf(address: AddressInfo | string | null): number {
  if (address === null || typeof address === 'string') throw new Error('The stand-in got no port to listen on.');
  return address.port;
}
