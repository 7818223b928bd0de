import type Stripe from 'stripe';
import { z } from 'zod';
import { aCustomer } from '../objects/customer';
import { held } from './held';
import { email, expand, metadata, notPlayed, onlyExpand, text } from './parameters';
import { route, type Route } from './route';

const line = text().optional();
const postalAddress = z
  .strictObject({ city: line, country: line, line1: line, line2: line, postal_code: line, state: line })
  .transform(({ city, country, line1, line2, postal_code, state }) => ({
    city: city ?? null,
    country: country ?? null,
    line1: line1 ?? null,
    line2: line2 ?? null,
    postal_code: postal_code ?? null,
    state: state ?? null,
  }));

export const customerRoutes: Route[] = [
  route(
    'POST',
    '/v1/customers',
    z.strictObject({
      address: postalAddress.optional(),
      balance: notPlayed,
      business_name: notPlayed,
      cash_balance: notPlayed,
      description: text().optional(),
      email: email.optional(),
      expand,
      individual_name: notPlayed,
      invoice_prefix: notPlayed,
      invoice_settings: notPlayed,
      metadata: metadata.optional(),
      name: text(256).optional(),
      next_invoice_sequence: notPlayed,
      payment_method: notPlayed,
      phone: text(20).optional(),
      preferred_locales: z.array(text()).optional(),
      shipping: notPlayed,
      source: notPlayed,
      tax: notPlayed,
      tax_exempt: notPlayed,
      tax_id_data: notPlayed,
      test_clock: notPlayed,
      validate: notPlayed,
    } satisfies Record<keyof Stripe.CustomerCreateParams, z.ZodType>),
    (world, input) => {
      const customer = aCustomer(input, world.clock.seconds());
      world.store.shelves.customers.set(customer.id, customer);
      return customer;
    },
  ),
  route('GET', '/v1/customers/:id', onlyExpand, (world, _, id) => held(world.store.shelves.customers, 'customer', id)),
];
