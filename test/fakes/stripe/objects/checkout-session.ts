import type Stripe from 'stripe';
import { newId } from '../identifiers';
import type { SessionInput } from '../api/session-input';

interface Facts {
  input: SessionInput;
  lines: Stripe.LineItem[];
  currency: string;
  created: number;
  expiresAt: number;
  customer: Stripe.Customer | undefined;
  origin: string;
}

/** An open session of the hosted page; it gets its payment intent with the first attempt to pay. */
export function aCheckoutSession({ input, lines, currency, created, expiresAt, customer, origin }: Facts) {
  const id = newId('cs_test', 58);
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  const mail = input.customer_email ?? customer?.email ?? null;
  const session: Stripe.Checkout.Session = {
    id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: false },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: input.allowed_payment_method_types ?? null,
    amount_subtotal: total,
    amount_total: total,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: input.billing_address_collection ?? null,
    cancel_url: input.cancel_url ?? null,
    client_reference_id: input.client_reference_id ?? null,
    client_secret: null,
    collected_information: { business_name: null, individual_name: null, shipping_details: null },
    consent: null,
    consent_collection: null,
    created,
    currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: { after_submit: null, shipping_address: null, submit: null, terms_of_service_acceptance: null },
    customer: customer?.id ?? null,
    customer_account: null,
    customer_creation: customer ? null : (input.customer_creation ?? 'if_required'),
    customer_details: mail === null ? null : detailsOf(mail, customer?.name ?? null),
    customer_email: input.customer_email ?? null,
    discounts: [],
    expires_at: expiresAt,
    integration_identifier: null,
    invoice: null,
    invoice_creation: {
      enabled: false,
      invoice_data: {
        account_tax_ids: null,
        custom_fields: null,
        description: null,
        footer: null,
        issuer: null,
        metadata: {},
        rendering_options: null,
      },
    },
    livemode: false,
    locale: input.locale ?? null,
    managed_payments: { enabled: false },
    metadata: input.metadata ?? {},
    mode: input.mode,
    origin_context: null,
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_status: 'unpaid',
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: input.submit_type ?? null,
    subscription: null,
    success_url: input.success_url,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: `${origin}/pay/${id}`,
    wallet_options: null,
  };
  return session;
}

export function detailsOf(email: string | null, name: string | null): Stripe.Checkout.Session.CustomerDetails {
  return {
    address: null,
    business_name: null,
    email,
    individual_name: null,
    name,
    phone: null,
    tax_exempt: 'none',
    tax_ids: [],
  };
}
