import type { Knex } from 'knex';

/** What of the store's books does not agree; an empty list is what every test wants. */
export async function ledgerFaults(sql: Knex): Promise<string[]> {
  return [...(await balanceFaults(sql)), ...(await sumFaults(sql))];
}

async function balanceFaults(sql: Knex): Promise<string[]> {
  const moved = await totals(sql('movements'), ['lot_id', 'bin_id'], 'quantity');
  const held = await totals(sql('balances'), ['lot_id', 'bin_id'], 'on_hand');
  return [...new Set([...moved.keys(), ...held.keys()])].flatMap((key) => {
    const [sum, balance] = [moved.get(key) ?? 0, held.get(key) ?? 0];
    if (balance < 0) return [`${key} holds ${balance}`];
    return sum === balance ? [] : [`${key}: movements give ${sum}, the balance says ${balance}`];
  });
}

async function sumFaults(sql: Knex): Promise<string[]> {
  const accepted = await totals(
    sql('balances').join('lots', 'lots.id', 'balances.lot_id').where('lots.state', 'accepted'),
    ['balances.part_id'],
    'balances.on_hand',
  );
  const promised = (state: string) =>
    totals(
      sql('reservation_lines')
        .join('reservations', 'reservations.id', 'reservation_lines.reservation_id')
        .where('reservations.state', state),
      ['reservation_lines.part_id'],
      'reservation_lines.quantity',
    );
  const [reserved, allocated] = [await promised('reserved'), await promised('allocated')];
  const stock = await sql('part_stock').select<
    { part_id: string; accepted: number; reserved: number; allocated: number }[]
  >('part_id', 'accepted', 'reserved', 'allocated');
  return stock.flatMap((row) => {
    const faults = [
      ['accepted', row.accepted, accepted.get(row.part_id) ?? 0],
      ['reserved', row.reserved, reserved.get(row.part_id) ?? 0],
      ['allocated', row.allocated, allocated.get(row.part_id) ?? 0],
    ].flatMap(([name, kept, counted]) =>
      kept === counted ? [] : [`${row.part_id}: ${name} is kept as ${kept}, counted ${counted}`],
    );
    if (row.reserved + row.allocated > row.accepted) faults.push(`${row.part_id} is promised twice`);
    return faults;
  });
}

async function totals(query: Knex.QueryBuilder, keys: string[], quantity: string): Promise<Map<string, number>> {
  const rows: Record<string, unknown>[] = await query.groupBy(keys).select(keys).sum({ total: quantity });
  return new Map(rows.map(({ total, ...key }) => [Object.values(key).map(String).join(' '), Number(total)] as const));
}
