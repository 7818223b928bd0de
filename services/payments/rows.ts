import type { Knex } from 'knex';

export async function hasEvent(sql: Knex, id: string): Promise<boolean> {
  const row = await sql('payment_events').where({ id }).select('id').first<{ id: string } | undefined>();
  return row !== undefined;
}

export async function insertEvent(
  sql: Knex.Transaction,
  event: { id: string; type: string; orderId: string | null; receivedAt: number },
): Promise<void> {
  await sql('payment_events').insert({
    id: event.id,
    type: event.type,
    order_id: event.orderId,
    received_at: event.receivedAt,
  });
}
