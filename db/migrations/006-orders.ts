import type { Knex } from 'knex';
import { createTable, makeAppendOnly, uniqueWhere } from '../dialect';

/** Prices, delivery, tax, baskets, orders, what is set aside for them, their money and invoices. */
export async function up(sql: Knex): Promise<void> {
  await createTable(sql, 'prices', (table) => {
    table.string('id').primary();
    table.string('kit_id').notNullable().references('kits.id');
    table.integer('from_quantity').notNullable().checkBetween([1, 100_000], 'price_from');
    /** Tax included. */
    table.integer('unit_minor').notNullable().checkBetween([1, 100_000_000], 'price_unit');
    table.string('currency').notNullable();
    table.unique(['kit_id', 'from_quantity']);
  });
  await createTable(sql, 'delivery_methods', (table) => {
    table.string('code').primary();
    table.string('name').notNullable();
    table.string('promise').notNullable();
    /** Two-letter codes, comma between; "*" for everywhere else. */
    table.string('countries').notNullable();
    table.integer('price_minor').notNullable().checkBetween([0, 10_000_000], 'delivery_price');
    table.string('currency').notNullable();
    table.integer('position').notNullable();
  });
  await createTable(sql, 'tax_rates', (table) => {
    table.string('country').primary();
    table.integer('basis_points').notNullable().checkBetween([0, 10_000], 'tax_rate');
  });

  await createTable(sql, 'baskets', (table) => {
    table.string('id').primary();
    table.integer('updated_at').notNullable();
  });
  await createTable(sql, 'basket_lines', (table) => {
    table.string('basket_id').notNullable().references('baskets.id');
    table.string('version_id').notNullable().references('versions.id').index('basket_lines_by_version');
    table.integer('quantity').notNullable().checkBetween([1, 500], 'basket_quantity');
    table.primary(['basket_id', 'version_id']);
  });

  await createTable(sql, 'orders', (table) => {
    table.string('id').primary();
    table.string('number').notNullable().unique();
    table.string('customer_id').references('people.id');
    table.string('email').notNullable();
    table.string('name').notNullable();
    /** SHA-256 of the long link that opens the order without signing in. */
    table.string('link_hash').notNullable().unique();
    table.text('address').notNullable();
    table.string('delivery_code').notNullable();
    table.string('gift_note').notNullable();
    table
      .string('payment')
      .notNullable()
      .checkIn(['awaiting-payment', 'paid', 'part-refunded', 'refunded', 'cancelled'], 'order_payment');
    table
      .string('fulfilment')
      .notNullable()
      .checkIn(['placed', 'allocated', 'backordered', 'picking', 'packed', 'shipped', 'cancelled'], 'order_fulfilment');
    table.string('currency').notNullable();
    table.integer('lines_minor').notNullable().checkBetween([0, 1_000_000_000], 'order_lines');
    table.integer('delivery_minor').notNullable().checkBetween([0, 10_000_000], 'order_delivery');
    table.integer('tax_minor').notNullable().checkBetween([0, 1_000_000_000], 'order_tax');
    table.integer('tax_basis_points').notNullable();
    table.integer('total_minor').notNullable().checkBetween([1, 1_000_000_000], 'order_total');
    table.integer('placed_at').notNullable();
    table.integer('paid_at');
    table.integer('shipped_at');
    /** The provider's checkout session and how often one was asked for; the key of each try is made from both. */
    table.string('session_id').unique();
    table.integer('session_attempt').notNullable();
    /** Why a person has to look at it; empty as a rule. */
    table.string('look_at_it').notNullable();
    /** 1 where somebody has to: what an index can lead to. */
    table.specificType(
      'to_look_at',
      "integer generated always as (case when look_at_it = '' then 0 else 1 end) stored",
    );
    table.check('total_minor = lines_minor + delivery_minor', [], 'order_adds_up');
    table.index(['customer_id', 'placed_at', 'id'], 'orders_by_customer');
    table.index(['fulfilment', 'paid_at', 'id'], 'orders_by_fulfilment');
    table.index(['fulfilment', 'placed_at', 'id'], 'orders_by_progress');
    table.index(['payment', 'placed_at', 'id'], 'orders_by_payment');
    table.index(['fulfilment', 'payment', 'placed_at', 'id'], 'orders_by_state');
    table.index(['payment', 'paid_at'], 'orders_by_paying');
    table.index(['fulfilment', 'shipped_at'], 'orders_by_shipping');
    table.index(['to_look_at', 'placed_at', 'id'], 'orders_to_look_at');
    table.index(['email', 'placed_at'], 'orders_by_email');
    table.index(['placed_at', 'id'], 'orders_by_age');
  });
  await createTable(sql, 'order_lines', (table) => {
    table.string('id').primary();
    table.string('order_id').notNullable().references('orders.id').index('order_lines_by_order');
    table.string('version_id').notNullable().references('versions.id').index('order_lines_by_version');
    table.integer('quantity').notNullable().checkBetween([1, 500], 'order_line_quantity');
    table.integer('unit_minor').notNullable().checkBetween([1, 100_000_000], 'order_line_unit');
    table.integer('position').notNullable();
    table.unique(['order_id', 'version_id']);
  });

  await createTable(sql, 'reservations', (table) => {
    table.string('id').primary();
    table.string('order_id').notNullable().references('orders.id');
    table
      .string('state')
      .notNullable()
      .checkIn(['reserved', 'allocated', 'lapsed', 'given-back', 'used'], 'reservation_state');
    table.integer('expires_at').notNullable();
    table.index(['state', 'expires_at'], 'reservations_due');
  });
  await uniqueWhere(
    sql,
    'reservations',
    'one_live_reservation_an_order',
    ['order_id'],
    "state in ('reserved', 'allocated')",
  );
  await createTable(sql, 'reservation_lines', (table) => {
    table.string('reservation_id').notNullable().references('reservations.id');
    table.string('part_id').notNullable().references('parts.id').index('reservation_lines_by_part');
    table.integer('quantity').notNullable().checkBetween([0, 1_000_000_000], 'reservation_quantity');
    table.primary(['reservation_id', 'part_id']);
  });

  await createTable(sql, 'payment_events', (table) => {
    table.string('id').primary();
    table.string('type').notNullable();
    table.string('order_id').references('orders.id').index('payment_events_by_order');
    table.integer('received_at').notNullable();
  });
  await createTable(sql, 'order_money', (table) => {
    table.string('id').primary();
    table.string('order_id').notNullable().references('orders.id').index('order_money_by_order');
    table.string('kind').notNullable().checkIn(['paid', 'refunded'], 'order_money_kind');
    table.integer('amount_minor').notNullable().checkBetween([1, 1_000_000_000], 'order_money_amount');
    table.string('currency').notNullable();
    /** The provider's id of the movement of money: it is booked once. */
    table.string('reference').notNullable().unique();
    table.integer('at').notNullable().index('order_money_by_time');
  });
  await makeAppendOnly(sql, 'order_money');
  await createTable(sql, 'invoices', (table) => {
    table.string('id').primary();
    table.integer('number').notNullable().unique();
    table.string('order_id').notNullable().unique().references('orders.id');
    table.integer('issued_at').notNullable();
    table.text('content').notNullable();
  });
  await makeAppendOnly(sql, 'invoices');
}

export async function down(sql: Knex): Promise<void> {
  const tables = [
    'invoices',
    'order_money',
    'payment_events',
    'reservation_lines',
    'reservations',
    'order_lines',
    'orders',
    'basket_lines',
    'baskets',
    'tax_rates',
    'delivery_methods',
    'prices',
  ];
  for (const table of tables) await sql.schema.dropTable(table);
}
