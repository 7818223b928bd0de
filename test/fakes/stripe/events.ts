import Stripe from 'stripe';
import { newId } from './identifiers';
import type { World } from './world';

export type EventType = Stripe.Event['type'];
export type ObjectOf<T extends EventType> = Extract<Stripe.Event, { type: T }>['data']['object'];

/** Dates the event, keeps the object as it is now, and hands it to the deliveries. */
export function announce<T extends EventType>(
  world: World,
  type: T,
  object: ObjectOf<T>,
  request: Stripe.Event.Request | null = null,
): Stripe.EventBase {
  const event: Stripe.EventBase = {
    id: newId('evt'),
    object: 'event',
    api_version: Stripe.API_VERSION,
    created: world.clock.seconds(),
    data: { object: asSent(object) },
    livemode: false,
    pending_webhooks: world.settings.webhook ? 1 : 0,
    request: request ?? { id: null, idempotency_key: null },
    type,
  };
  world.store.shelves.events.set(event.id, event);
  world.deliveries.queue(event);
  return event;
}

/** What the receiver would read: later changes of the object do not reach an event already made. */
function asSent<T>(object: T): T {
  return JSON.parse(JSON.stringify(object));
}
