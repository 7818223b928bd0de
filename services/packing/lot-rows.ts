import type { Knex } from 'knex';
import type { BinId, LineId, LotId } from '../ids';
import type { Instant } from '../time';
import type { LotPlace } from './schemas';

export type LotOfPart = LotPlace & { partId: string };

/** Accepted lots of some parts that lie in bins, oldest receipt first. */
export function lotsOf(sql: Knex, partIds: readonly string[]): Promise<LotOfPart[]> {
  return sql('balances')
    .join('lots', 'lots.id', 'balances.lot_id')
    .join('bins', 'bins.id', 'balances.bin_id')
    .whereIn('balances.part_id', partIds)
    .where('lots.state', 'accepted')
    .where('balances.on_hand', '>', 0)
    .orderBy(['lots.received_at', 'lots.code', 'bins.position'])
    .select<LotOfPart[]>({
      partId: 'balances.part_id',
      lotId: 'lots.id',
      lotCode: 'lots.code',
      binId: 'bins.id',
      binCode: 'bins.code',
      binPosition: 'bins.position',
      onHand: 'balances.on_hand',
    });
}

export interface LotRow {
  id: LotId;
  code: string;
  partId: string;
  partCode: string;
  name: string;
  state: 'quarantine' | 'accepted' | 'blocked';
  supplier: string;
  receivedAt: Instant;
}

export function findLot(sql: Knex, code: string): Promise<LotRow | undefined> {
  return sql('lots').join('parts', 'parts.id', 'lots.part_id').where('lots.code', code).first<LotRow | undefined>({
    id: 'lots.id',
    code: 'lots.code',
    partId: 'lots.part_id',
    partCode: 'parts.code',
    name: 'parts.name',
    state: 'lots.state',
    supplier: 'lots.supplier',
    receivedAt: 'lots.received_at',
  });
}

export const findPart = (sql: Knex, code: string) =>
  sql('parts').where('code', code).first<{ id: string; code: string; name: string } | undefined>('id', 'code', 'name');

/** A lot in a box, line by line: what was picked less what was put back. */
export interface InBox {
  lineId: LineId;
  lotId: LotId;
  lotCode: string;
  lotState: LotRow['state'];
  binId: BinId;
  name: string;
  quantity: number;
  /** When the last piece of it was scanned. */
  at: Instant;
}

/** What lies in a box, the last picked first. */
export async function inBox(sql: Knex, boxId: string): Promise<InBox[]> {
  const picks = await sql('box_picks')
    .join('lots', 'lots.id', 'box_picks.lot_id')
    .join('parts', 'parts.id', 'box_picks.part_id')
    .where('box_picks.box_id', boxId)
    .orderBy('box_picks.at', 'desc')
    .select<InBox[]>({
      lineId: 'box_picks.box_line_id',
      lotId: 'lots.id',
      lotCode: 'lots.code',
      lotState: 'lots.state',
      binId: 'box_picks.bin_id',
      name: 'parts.name',
      quantity: 'box_picks.quantity',
      at: 'box_picks.at',
    });
  const sums = new Map<string, InBox>();
  for (const pick of picks) {
    const key = `${pick.lineId} ${pick.lotId} ${pick.binId}`;
    const sum = sums.get(key);
    if (sum) sum.quantity += pick.quantity;
    else sums.set(key, pick);
  }
  return [...sums.values()].filter((sum) => sum.quantity > 0);
}
