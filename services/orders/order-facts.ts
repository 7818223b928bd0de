import type { Knex } from 'knex';

/** Parcels an order left in, first one first. */
export async function shipmentsOf(
  sql: Knex,
  orderId: string,
): Promise<{ carrier: string; trackingNumber: string; at: number }[]> {
  return sql('shipments')
    .where({ order_id: orderId })
    .orderBy(['shipped_at', 'id'])
    .select<{ carrier: string; trackingNumber: string; at: number }[]>({
      carrier: 'carrier',
      trackingNumber: 'tracking_number',
      at: 'shipped_at',
    });
}

/** The kind of the provider's last report about an order. */
export async function lastEventOf(sql: Knex, orderId: string): Promise<string | null> {
  const row = await sql('payment_events')
    .where({ order_id: orderId })
    .orderBy([
      { column: 'received_at', order: 'desc' },
      { column: 'id', order: 'desc' },
    ])
    .select('type')
    .first<{ type: string } | undefined>();
  return row?.type ?? null;
}
