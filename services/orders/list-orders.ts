import type { Knex } from 'knex';
import { type Actor, must, personIdOf } from '../access';
import { Currency, money } from '../money';
import { parse } from '../problem';
import { reading } from '../record';
import { ListOrders, type OrderFilter, OrderPage } from './schemas';

const pageSize = 40;

const filters: Record<OrderFilter, (query: Knex.QueryBuilder) => Knex.QueryBuilder> = {
  all: (query) => query,
  'to-send': (query) =>
    query
      .whereIn('orders.payment', ['paid', 'part-refunded'])
      .whereIn('orders.fulfilment', ['allocated', 'backordered', 'picking', 'packed']),
  unpaid: (query) => query.where('orders.payment', 'awaiting-payment'),
  'look-at': (query) => query.where('orders.to_look_at', 1),
  sent: (query) => query.where('orders.fulfilment', 'shipped'),
  cancelled: (query) => query.where('orders.fulfilment', 'cancelled'),
};

/** All orders, newest first, for the owner. */
export async function listOrders(actor: Actor, input: ListOrders = {}): Promise<OrderPage> {
  must(actor, 'order.list');
  const { show, after } = parse(ListOrders, input);
  return page(filters[show](reading()('orders')), after, true);
}

/** The orders of whoever is signed in, newest first. */
export async function listMyOrders(actor: Actor, input: Pick<ListOrders, 'after'> = {}): Promise<OrderPage> {
  must(actor, 'order.list-own');
  const { after } = parse(ListOrders, input);
  return page(reading()('orders').where('orders.customer_id', personIdOf(actor)), after, false);
}

interface Row {
  id: string;
  number: string;
  name: string;
  placedAt: number;
  payment: string;
  fulfilment: string;
  totalMinor: number;
  currency: string;
  lookAtIt: string;
}

async function page(query: Knex.QueryBuilder, after: string | undefined, forStaff: boolean): Promise<OrderPage> {
  if (after !== undefined) {
    const [at, id = ''] = after.split('-');
    // The first of the two conditions is what the index is entered by.
    query
      .andWhere('orders.placed_at', '<=', Number(at))
      .andWhere((older) =>
        older
          .where('orders.placed_at', '<', Number(at))
          .orWhere((same) => same.where('orders.placed_at', Number(at)).andWhere('orders.id', '<', id)),
      );
  }
  const found: Row[] = await query
    .orderBy([
      { column: 'orders.placed_at', order: 'desc' },
      { column: 'orders.id', order: 'desc' },
    ])
    .limit(pageSize + 1)
    .select({
      id: 'orders.id',
      number: 'orders.number',
      name: 'orders.name',
      placedAt: 'orders.placed_at',
      payment: 'orders.payment',
      fulfilment: 'orders.fulfilment',
      totalMinor: 'orders.total_minor',
      currency: 'orders.currency',
      lookAtIt: 'orders.look_at_it',
    });
  const shown = found.slice(0, pageSize);
  const kits = await kitsOf(shown.map((row) => row.id));
  const last = shown.at(-1);
  return OrderPage.parse({
    orders: shown.map(({ totalMinor, currency, lookAtIt, ...row }) => ({
      ...row,
      ...(kits.get(row.id) ?? { kits: '', quantity: 0 }),
      total: money(totalMinor, Currency.parse(currency)),
      lookAtIt: forStaff && lookAtIt !== '' ? lookAtIt : null,
    })),
    older: found.length > pageSize && last ? `${last.placedAt}-${last.id}` : null,
  });
}

/** "2 Ebb Lamp 7 B, 1 Tollgate 4 F" by order. */
async function kitsOf(orderIds: readonly string[]): Promise<Map<string, { kits: string; quantity: number }>> {
  if (orderIds.length === 0) return new Map();
  const lines = await reading()('order_lines')
    .join('versions', 'versions.id', 'order_lines.version_id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .whereIn('order_lines.order_id', [...orderIds])
    .orderBy(['order_lines.order_id', 'order_lines.position'])
    .select<{ orderId: string; name: string; number: number; letter: string; quantity: number }[]>({
      orderId: 'order_lines.order_id',
      name: 'kits.name',
      number: 'kits.number',
      letter: 'versions.letter',
      quantity: 'order_lines.quantity',
    });
  const byOrder = new Map<string, { kits: string; quantity: number }>();
  for (const { orderId, name, number, letter, quantity } of lines) {
    const before = byOrder.get(orderId);
    const words = `${quantity} ${name} ${number}\u202f${letter}`;
    byOrder.set(orderId, {
      kits: before ? `${before.kits}, ${words}` : words,
      quantity: (before?.quantity ?? 0) + quantity,
    });
  }
  return byOrder;
}
