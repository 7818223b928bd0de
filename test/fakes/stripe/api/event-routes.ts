import type Stripe from 'stripe';
import { z } from 'zod';
import { held } from './held';
import { inRange, newestFirst, pageOf } from './lists';
import { created, flag, onlyExpand, page, text } from './parameters';
import { route, type Route } from './route';

export const eventRoutes: Route[] = [
  route(
    'GET',
    '/v1/events',
    z.strictObject({
      ...page,
      created,
      delivery_success: flag.optional(),
      type: text().optional(),
      types: z.array(text()).max(20).optional(),
    } satisfies Record<keyof Stripe.EventListParams, z.ZodType>),
    (world, input) => {
      const types = input.types ?? (input.type === undefined ? [] : [input.type]);
      const found = newestFirst(world.store.shelves.events)
        .filter((one) => inRange(one.created, input.created))
        .filter((one) => types.length === 0 || types.some((type) => fits(one.type, type)))
        .filter(
          (one) => input.delivery_success === undefined || (one.pending_webhooks === 0) === input.delivery_success,
        );
      return pageOf(found, input, '/v1/events');
    },
  ),
  route('GET', '/v1/events/:id', onlyExpand, (world, _, id) => held(world.store.shelves.events, 'event', id)),
];

/** `charge.*` asks for all events about charges. */
function fits(type: string, asked: string): boolean {
  return asked.endsWith('*') ? type.startsWith(asked.slice(0, -1)) : type === asked;
}
