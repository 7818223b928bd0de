import type Stripe from 'stripe';
import { newId } from '../identifiers';

type Told = 'address' | 'description' | 'email' | 'metadata' | 'name' | 'phone' | 'preferred_locales';
export type CustomerFacts = { [K in Told]?: Stripe.Customer[K] | undefined };

export function aCustomer(facts: CustomerFacts, created: number): Stripe.Customer {
  return {
    id: newId('cus', 14),
    object: 'customer',
    address: facts.address ?? null,
    balance: 0,
    created,
    currency: null,
    default_source: null,
    delinquent: false,
    description: facts.description ?? null,
    discount: null,
    email: facts.email ?? null,
    invoice_prefix: newId('x', 8).slice(2).toUpperCase(),
    invoice_settings: { custom_fields: null, default_payment_method: null, footer: null, rendering_options: null },
    livemode: false,
    metadata: facts.metadata ?? {},
    name: facts.name ?? null,
    next_invoice_sequence: 1,
    phone: facts.phone ?? null,
    preferred_locales: facts.preferred_locales ?? [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: null,
  };
}
