import type Stripe from 'stripe';
import { newId } from './identifiers';
import { signed } from './signature';
import type { World } from './world';

export interface DeliveryAttempt {
  /** UTC ms of the stand-in's clock. */
  at: number;
  status: number | null;
  error: string | null;
}

/** One event on its way to the endpoint; a duplicate is a delivery of its own. */
export interface Delivery {
  id: string;
  eventId: string;
  type: string;
  state: 'waiting' | 'held' | 'dropped' | 'delivered' | 'given up';
  attempts: DeliveryAttempt[];
}

export interface DeliverOptions {
  /** Dates the signature this long ago. */
  ageSeconds?: number;
  secret?: string;
  /** Changes the body before it is signed. */
  alter?: (body: string) => string;
  /** Changes the body after it is signed. */
  tamper?: (body: string) => string;
  /** Leaves the signature out. */
  unsigned?: boolean;
}

const ANSWER_WITHIN_MS = 10_000;

export class Deliveries {
  private queued = 0;
  private held: Delivery[] = [];
  private toReorder: Delivery[] = [];
  private readonly errands = new Set<object>();
  private waiters: (() => void)[] = [];
  private readonly closing = new AbortController();

  constructor(private readonly world: Pick<World, 'settings' | 'clock' | 'store' | 'switches' | 'save'>) {}

  queue(event: Stripe.EventBase): void {
    const { settings, switches } = this.world;
    if (!settings.webhook) return;
    this.queued += 1;
    const everyNth = switches.dropEvery > 0 && this.queued % switches.dropEvery === 0;
    if (everyNth || switches.dropNext > 0) {
      if (!everyNth) switches.dropNext -= 1;
      this.newDelivery(event, 'dropped');
      return;
    }
    for (let copy = 0; copy <= switches.duplicate; copy += 1) this.route(this.newDelivery(event, 'waiting'));
  }

  /** Sends what waits for `hold` to be switched off, or for the pile to reorder to be high enough. */
  release(): void {
    const { switches } = this.world;
    if (switches.hold) return;
    this.sendInTurn(this.held.splice(0));
    if (this.toReorder.length >= switches.reorder) this.sendInTurn(this.toReorder.splice(0).reverse());
  }

  /** One more try now, whatever became of the event before. */
  async again(eventId: string, options: DeliverOptions = {}): Promise<{ status: number; body: string }> {
    const { settings, store } = this.world;
    const event = store.shelves.events.get(eventId);
    if (!event) throw new Error(`There is no event ${eventId}. List the events to see their ids.`);
    if (!settings.webhook) throw new Error('The stand-in was started without a webhook address to deliver to.');
    const response = await this.post(settings.webhook, event, options);
    if (response.status >= 200 && response.status < 300) event.pending_webhooks = 0;
    return response;
  }

  list(): Delivery[] {
    return [...this.world.store.shelves.deliveries.values()];
  }

  /** When nothing waits to be sent; held and dropped events do not count. */
  async settled(): Promise<void> {
    while (this.errands.size > 0) await new Promise<void>((resolve) => this.waiters.push(resolve));
  }

  /** After a restart: what was on its way sets out again. */
  resume(): void {
    for (const delivery of this.list()) {
      if (delivery.state === 'waiting' || delivery.state === 'held') this.route(delivery);
    }
  }

  stop(): void {
    this.closing.abort();
    this.clear();
  }

  clear(): void {
    this.queued = 0;
    this.held = [];
    this.toReorder = [];
    this.errands.clear();
    this.wake();
  }

  private newDelivery(event: Stripe.EventBase, state: Delivery['state']): Delivery {
    const delivery: Delivery = { id: newId('dlv'), eventId: event.id, type: event.type, state, attempts: [] };
    this.world.store.shelves.deliveries.set(delivery.id, delivery);
    return delivery;
  }

  private route(delivery: Delivery): void {
    const { clock, switches } = this.world;
    delivery.state = switches.hold || switches.reorder > 0 ? 'held' : 'waiting';
    if (switches.hold) this.held.push(delivery);
    else if (switches.reorder > 0) this.toReorder.push(delivery);
    else this.sendAt(delivery, clock.now() + switches.webhookDelayMs);
    this.release();
  }

  private sendAt(delivery: Delivery, due: number): void {
    const errand = {};
    this.errands.add(errand);
    this.world.clock.at(due, () => void this.send(delivery).finally(() => this.landed(errand)));
  }

  /** Each waits for the answer to the one before, so that the order is certain. */
  private sendInTurn(pile: Delivery[]): void {
    let turn = Promise.resolve();
    for (const delivery of pile) {
      delivery.state = 'waiting';
      const errand = {};
      this.errands.add(errand);
      turn = turn.then(() => this.send(delivery)).finally(() => this.landed(errand));
    }
  }

  private landed(errand: object): void {
    this.errands.delete(errand);
    if (this.errands.size === 0) this.wake();
  }

  private wake(): void {
    for (const waiter of this.waiters.splice(0)) waiter();
  }

  private async send(delivery: Delivery): Promise<void> {
    const { clock, settings, store } = this.world;
    const event = store.shelves.events.get(delivery.eventId);
    if (this.closing.signal.aborted || !event || !settings.webhook) return;
    const attempt: DeliveryAttempt = { at: clock.now(), status: null, error: null };
    delivery.attempts.push(attempt);
    try {
      attempt.status = (await this.post(settings.webhook, event, {})).status;
    } catch (error) {
      attempt.error = error instanceof Error ? error.message : String(error);
    }
    if (this.closing.signal.aborted || !store.shelves.deliveries.has(delivery.id)) return;
    this.conclude(delivery, event, attempt);
    this.world.save();
    settings.log(`${event.type} ${event.id}: ${attempt.status ?? attempt.error} (${delivery.state})`);
  }

  private conclude(delivery: Delivery, event: Stripe.EventBase, { status }: DeliveryAttempt): void {
    const { clock, settings } = this.world;
    const wait = settings.retryDelaysMs[delivery.attempts.length - 1];
    if (status !== null && status >= 200 && status < 300) {
      delivery.state = 'delivered';
      event.pending_webhooks = 0;
    } else if (wait === undefined) delivery.state = 'given up';
    else this.sendAt(delivery, clock.now() + wait);
  }

  private async post(url: string, event: Stripe.EventBase, options: DeliverOptions) {
    const { body, signature } = signed(event, this.world.settings.secrets, options);
    const response = await fetch(url, {
      method: 'POST',
      redirect: 'manual',
      signal: AbortSignal.any([AbortSignal.timeout(ANSWER_WITHIN_MS), this.closing.signal]),
      headers: {
        'content-type': 'application/json; charset=utf-8',
        'user-agent': 'Stripe/1.0 (local stand-in)',
        ...(signature && { 'stripe-signature': signature }),
      },
      body,
    });
    return { status: response.status, body: await response.text() };
  }
}
