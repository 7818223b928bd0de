import Stripe from 'stripe';
import { newId } from '../identifiers';
import type { LineInput } from '../api/session-input';

/** A line with the price and product that its `price_data` makes on the fly. */
export function aLine(input: LineInput, created: number): { line: Stripe.LineItem; product: Stripe.Product } {
  const { price_data: price, quantity } = input;
  const product = aProduct(price.product_data, created);
  const total = price.unit_amount * quantity;
  const line: Stripe.LineItem = {
    id: newId('li'),
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: total,
    amount_tax: 0,
    amount_total: total,
    currency: price.currency,
    description: price.product_data.name,
    metadata: input.metadata ?? {},
    price: {
      id: newId('price'),
      object: 'price',
      active: false,
      billing_scheme: 'per_unit',
      created,
      currency: price.currency,
      custom_unit_amount: null,
      livemode: false,
      lookup_key: null,
      metadata: {},
      nickname: null,
      product: product.id,
      recurring: null,
      tax_behavior: price.tax_behavior ?? 'unspecified',
      tiers_mode: null,
      transform_quantity: null,
      type: 'one_time',
      unit_amount: price.unit_amount,
      unit_amount_decimal: Stripe.Decimal.from(price.unit_amount),
    },
    quantity,
  };
  return { line, product };
}

function aProduct(input: LineInput['price_data']['product_data'], created: number): Stripe.Product {
  return {
    id: newId('prod', 14),
    object: 'product',
    active: false,
    created,
    description: input.description ?? null,
    images: input.images ?? [],
    livemode: false,
    marketing_features: [],
    metadata: input.metadata ?? {},
    name: input.name,
    package_dimensions: null,
    shippable: null,
    tax_code: input.tax_code ?? null,
    tax_details: null,
    type: 'service',
    unit_label: input.unit_label ?? null,
    updated: created,
    url: null,
  };
}
