import { z } from 'zod';
import { createSession, expireSession, sessionRecord } from '../sessions';
import { inRange, newestFirst, pageOf } from './lists';
import { onlyExpand, page } from './parameters';
import { route, type Route } from './route';
import { sessionInput, sessionListInput } from './session-input';

export const sessionRoutes: Route[] = [
  route('POST', '/v1/checkout/sessions', sessionInput, createSession),
  route('GET', '/v1/checkout/sessions', sessionListInput, (world, input) => {
    const found = newestFirst(world.store.shelves.sessions)
      .map(({ session }) => session)
      .filter((one) => inRange(one.created, input.created))
      .filter((one) => input.status === undefined || one.status === input.status)
      .filter((one) => input.customer === undefined || one.customer === input.customer)
      .filter((one) => input.payment_intent === undefined || one.payment_intent === input.payment_intent)
      .filter((one) => !input.customer_details || one.customer_details?.email === input.customer_details.email);
    return pageOf(found, input, '/v1/checkout/sessions');
  }),
  route('GET', '/v1/checkout/sessions/:id', onlyExpand, (world, _, id) => sessionRecord(world, id).session),
  route('POST', '/v1/checkout/sessions/:id/expire', onlyExpand, (world, _, id) =>
    expireSession(world, sessionRecord(world, id)),
  ),
  route('GET', '/v1/checkout/sessions/:id/line_items', z.strictObject(page), (world, input, id) =>
    pageOf(sessionRecord(world, id).lines, input, `/v1/checkout/sessions/${id}/line_items`),
  ),
];
