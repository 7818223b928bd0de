import type { Knex } from 'knex';

export interface Booked {
  orderId: string;
  kind: 'paid' | 'refunded';
  minor: number;
  at: number;
}

/** Money that came and went since a moment. */
export function booked(sql: Knex, since: number): Promise<Booked[]> {
  return sql('order_money')
    .where('at', '>=', since)
    .select<Booked[]>({ orderId: 'order_id', kind: 'kind', minor: 'amount_minor', at: 'at' });
}

export interface SentOrder {
  paidAt: number;
  shippedAt: number;
  boxes: number;
}

/** Orders that left since a moment, with how many kits each held. */
export function sentSince(sql: Knex, since: number): Promise<SentOrder[]> {
  return sql('orders')
    .join('order_lines', 'order_lines.order_id', 'orders.id')
    .where('orders.fulfilment', 'shipped')
    .andWhere('orders.shipped_at', '>=', since)
    .groupBy('orders.shipped_at', 'orders.id', 'orders.paid_at')
    .select<SentOrder[]>({ paidAt: 'orders.paid_at', shippedAt: 'orders.shipped_at' })
    .sum({ boxes: 'order_lines.quantity' });
}

const open = ['allocated', 'backordered', 'picking', 'packed'];

export interface OpenOrder {
  id: string;
  number: string;
  name: string;
  paidAt: number;
  fulfilment: string;
}

/** Paid orders that have not left, oldest payment first. */
export function openOrders(sql: Knex): Promise<OpenOrder[]> {
  return sql('orders')
    .whereIn('fulfilment', open)
    .whereIn('payment', ['paid', 'part-refunded'])
    .whereNotNull('paid_at')
    .orderBy(['paid_at', 'id'])
    .select<OpenOrder[]>({ id: 'id', number: 'number', name: 'name', paidAt: 'paid_at', fulfilment: 'fulfilment' });
}

/** Kits in paid orders that have not left, less the boxes that are closed. */
export async function boxesToPack(sql: Knex): Promise<number> {
  const ordered = await sql('order_lines')
    .join('orders', 'orders.id', 'order_lines.order_id')
    .whereIn('orders.fulfilment', ['allocated', 'picking'])
    .sum({ all: 'order_lines.quantity' })
    .first<{ all: number | null } | undefined>();
  const closed = await sql('boxes')
    .join('orders', 'orders.id', 'boxes.order_id')
    .whereIn('orders.fulfilment', ['allocated', 'picking'])
    .andWhere('boxes.state', 'closed')
    .count({ all: 'boxes.id' })
    .first<{ all: number } | undefined>();
  return Number(ordered?.all ?? 0) - Number(closed?.all ?? 0);
}

export async function unpaidOrders(sql: Knex): Promise<number> {
  const row = await sql('orders')
    .where({ payment: 'awaiting-payment' })
    .count({ all: 'id' })
    .first<{ all: number } | undefined>();
  return Number(row?.all ?? 0);
}

export function ordersToLookAt(sql: Knex): Promise<{ id: string; number: string; why: string }[]> {
  return sql('orders')
    .where({ to_look_at: 1 })
    .orderBy([
      { column: 'placed_at', order: 'desc' },
      { column: 'id', order: 'desc' },
    ])
    .limit(6)
    .select<{ id: string; number: string; why: string }[]>({ id: 'id', number: 'number', why: 'look_at_it' });
}

export interface HeldVersion {
  id: string;
  name: string;
  kitNumber: number;
  letter: string;
  why: string;
}

/** Held versions that no later version answers yet. */
export function heldVersions(sql: Knex): Promise<HeldVersion[]> {
  return sql('versions')
    .join('kits', 'kits.id', 'versions.kit_id')
    .join('sign_offs', 'sign_offs.version_id', 'versions.id')
    .where({ 'versions.state': 'held', 'sign_offs.decision': 'held' })
    .whereNotExists((later) =>
      later
        .from('versions as later')
        .where('later.kit_id', sql.ref('versions.kit_id'))
        .andWhere('later.created_at', '>', sql.ref('versions.created_at'))
        .select('later.id'),
    )
    .orderBy('sign_offs.at', 'desc')
    .limit(6)
    .select<HeldVersion[]>({
      id: 'versions.id',
      name: 'kits.name',
      kitNumber: 'kits.number',
      letter: 'versions.letter',
      why: 'sign_offs.remark',
    });
}

/** Kits sold by kit since a moment, in paid orders. */
export async function soldSince(sql: Knex, since: number): Promise<Map<string, number>> {
  const rows = await sql('order_lines')
    .join('orders', 'orders.id', 'order_lines.order_id')
    .join('versions', 'versions.id', 'order_lines.version_id')
    .whereIn('orders.payment', ['paid', 'part-refunded'])
    .andWhere('orders.paid_at', '>=', since)
    .select<{ kitId: string; quantity: number }[]>({ kitId: 'versions.kit_id', quantity: 'order_lines.quantity' });
  const sold = new Map<string, number>();
  for (const { kitId, quantity } of rows) sold.set(kitId, (sold.get(kitId) ?? 0) + quantity);
  return sold;
}
