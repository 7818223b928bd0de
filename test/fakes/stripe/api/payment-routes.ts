import type Stripe from 'stripe';
import { z } from 'zod';
import { held } from './held';
import { inRange, newestFirst, pageOf } from './lists';
import { created, currency, notPlayed, onlyExpand, page, text } from './parameters';
import { route, type Route } from './route';

export const paymentRoutes: Route[] = [
  route(
    'GET',
    '/v1/payment_intents',
    z.strictObject({ ...page, created, customer: text().optional(), customer_account: notPlayed }),
    (world, input) => {
      const found = newestFirst(world.store.shelves.intents)
        .filter((one) => inRange(one.created, input.created))
        .filter((one) => input.customer === undefined || one.customer === input.customer);
      return pageOf(found, input, '/v1/payment_intents');
    },
  ),
  route('GET', '/v1/payment_intents/:id', onlyExpand, (world, _, id) =>
    held(world.store.shelves.intents, 'payment_intent', id),
  ),
  route('GET', '/v1/charges/:id', onlyExpand, (world, _, id) => held(world.store.shelves.charges, 'charge', id)),
  route('GET', '/v1/disputes/:id', onlyExpand, (world, _, id) => held(world.store.shelves.disputes, 'dispute', id)),
  route(
    'GET',
    '/v1/balance_transactions',
    z.strictObject({
      ...page,
      created,
      currency: currency.optional(),
      payout: notPlayed,
      source: text().optional(),
      type: text().optional(),
    } satisfies Record<keyof Stripe.BalanceTransactionListParams, z.ZodType>),
    (world, input) => {
      const found = newestFirst(world.store.shelves.transactions)
        .filter((one) => inRange(one.created, input.created))
        .filter((one) => input.source === undefined || one.source === input.source)
        .filter((one) => input.type === undefined || one.type === input.type)
        .filter((one) => input.currency === undefined || one.currency === input.currency);
      return pageOf(found, input, '/v1/balance_transactions');
    },
  ),
  route('GET', '/v1/balance_transactions/:id', onlyExpand, (world, _, id) =>
    held(world.store.shelves.transactions, 'balance transaction', id),
  ),
];
