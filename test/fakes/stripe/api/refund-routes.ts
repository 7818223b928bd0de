import type Stripe from 'stripe';
import { z } from 'zod';
import { createRefund } from '../refunds';
import { held } from './held';
import { inRange, newestFirst, pageOf } from './lists';
import { amount, created, expand, metadata, notPlayed, onlyExpand, page, text } from './parameters';
import { route, type Route } from './route';

export const refundRoutes: Route[] = [
  route(
    'POST',
    '/v1/refunds',
    z.strictObject({
      amount: amount.pipe(z.number().min(1)).optional(),
      charge: text().optional(),
      currency: notPlayed,
      customer: notPlayed,
      expand,
      instructions_email: notPlayed,
      metadata: metadata.optional(),
      origin: notPlayed,
      payment_intent: text().optional(),
      reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
      refund_application_fee: notPlayed,
      reverse_transfer: notPlayed,
    } satisfies Record<keyof Stripe.RefundCreateParams, z.ZodType>),
    createRefund,
  ),
  route(
    'GET',
    '/v1/refunds',
    z.strictObject({ ...page, created, charge: text().optional(), payment_intent: text().optional() }),
    (world, input) => {
      const found = newestFirst(world.store.shelves.refunds)
        .filter((one) => inRange(one.created, input.created))
        .filter((one) => input.charge === undefined || one.charge === input.charge)
        .filter((one) => input.payment_intent === undefined || one.payment_intent === input.payment_intent);
      return pageOf(found, input, '/v1/refunds');
    },
  ),
  route('GET', '/v1/refunds/:id', onlyExpand, (world, _, id) => held(world.store.shelves.refunds, 'refund', id)),
];
