import type { Knex } from 'knex';
import { difference } from '@/db/dialect';
import type { PartUnit } from '../parts/schemas';
import { availableFrom } from './rules';
import type { LotState } from './schemas';

export interface PartRow {
  id: string;
  code: string;
  name: string;
  unit: PartUnit;
}

export async function findPart(sql: Knex, id: string): Promise<PartRow | undefined> {
  return sql('parts').where({ id }).first<PartRow>('id', 'code', 'name', 'unit');
}

export interface LotRow {
  id: string;
  code: string;
  partId: string;
  state: LotState;
  unitCostMinor: number;
}

export async function findLot(sql: Knex, id: string): Promise<LotRow | undefined> {
  return sql('lots')
    .where({ id })
    .first<LotRow>('id', 'code', 'part_id as partId', 'state', 'unit_cost_minor as unitCostMinor');
}

export interface Balance {
  lotId: string;
  lotCode: string;
  binId: string;
  binCode: string;
  onHand: number;
}

/** Accepted lots of a part with something left, oldest receipt first, then the smaller rest so that bins empty. */
export function acceptedBalances(sql: Knex, partId: string): Promise<Balance[]> {
  return sql('lots')
    .join('balances', 'balances.lot_id', 'lots.id')
    .join('bins', 'bins.id', 'balances.bin_id')
    .where({ 'lots.part_id': partId, 'lots.state': 'accepted' })
    .andWhere('balances.on_hand', '>', 0)
    .orderBy(['lots.received_at', 'balances.on_hand', 'lots.code', 'bins.position'])
    .select<Balance[]>(
      'lots.id as lotId',
      'lots.code as lotCode',
      'bins.id as binId',
      'bins.code as binCode',
      'balances.on_hand as onHand',
    );
}

export async function onHandOfLot(sql: Knex, lotId: string): Promise<number> {
  const row = await sql('balances').where({ lot_id: lotId }).sum({ all: 'on_hand' }).first<{ all: number | null }>();
  return Number(row?.all ?? 0);
}

export interface NewMovement {
  id: string;
  at: number;
  partId: string;
  lotId: string;
  binId: string;
  quantity: number;
  kind: 'receipt' | 'pick' | 'pick-return' | 'move' | 'count-adjust' | 'scrap';
  reason: string;
  document: string;
  personId: string | null;
  unitCostMinor: number;
}

/** Appends a movement and keeps its balance; false when the bin does not hold that much. */
export async function move(sql: Knex.Transaction, movement: NewMovement): Promise<boolean> {
  const { lotId, binId, partId, quantity } = movement;
  const here = { lot_id: lotId, bin_id: binId };
  const changed = await sql('balances')
    .where(here)
    .andWhere('on_hand', '>=', Math.max(0, -quantity))
    .increment('on_hand', quantity);
  if (changed === 0) {
    if (quantity < 0) return false;
    await sql('balances').insert({ ...here, part_id: partId, on_hand: quantity });
  }
  const last = await sql('movements').max({ seq: 'seq' }).first<{ seq: number | null }>();
  await sql('movements').insert({
    seq: (last?.seq ?? 0) + 1,
    id: movement.id,
    at: movement.at,
    part_id: partId,
    lot_id: lotId,
    bin_id: binId,
    quantity,
    kind: movement.kind,
    reason: movement.reason,
    document: movement.document,
    person_id: movement.personId,
    unit_cost_minor: movement.unitCostMinor,
  });
  return true;
}

export interface StockChange {
  accepted?: number;
  reserved?: number;
  allocated?: number;
}

/**
 * Changes a part's sums in one statement, only where none falls below zero and nothing is promised twice.
 * @returns false when the stock does not allow it; nothing was changed then
 */
export async function changeStock(sql: Knex.Transaction, partId: string, change: StockChange): Promise<boolean> {
  const { accepted = 0, reserved = 0, allocated = 0 } = change;
  await sql('part_stock')
    .insert({ part_id: partId, accepted: 0, reserved: 0, allocated: 0 })
    .onConflict('part_id')
    .ignore();
  const changed = await sql('part_stock')
    .where({ part_id: partId })
    .andWhere('accepted', '>=', -accepted)
    .andWhere('reserved', '>=', -reserved)
    .andWhere('allocated', '>=', -allocated)
    .andWhere(difference(sql, 'accepted', 'reserved', 'allocated'), '>=', reserved + allocated - accepted)
    .increment({ accepted, reserved, allocated });
  return changed === 1;
}

export type ReservationState = 'reserved' | 'allocated' | 'lapsed' | 'given-back' | 'used';

export interface Reservation {
  id: string;
  orderId: string;
  state: ReservationState;
  expiresAt: number;
}
const reservationColumns = ['id', 'order_id as orderId', 'state', 'expires_at as expiresAt'] as const;

/** The one reservation of an order that still has an effect. */
export async function liveReservation(sql: Knex, orderId: string): Promise<Reservation | undefined> {
  return sql('reservations')
    .where({ order_id: orderId })
    .whereIn('state', ['reserved', 'allocated'])
    .first<Reservation>(...reservationColumns);
}

/** The order's last reservation, whatever became of it. */
export async function lastReservation(sql: Knex, orderId: string): Promise<Reservation | undefined> {
  return sql('reservations')
    .where({ order_id: orderId })
    .orderBy([{ column: 'expires_at', order: 'desc' }, { column: 'id' }])
    .first<Reservation>(...reservationColumns);
}

/** The order's allocation when all of it has been picked. */
export async function usedReservation(sql: Knex, orderId: string): Promise<Reservation | undefined> {
  return sql('reservations')
    .where({ order_id: orderId, state: 'used' })
    .first<Reservation>(...reservationColumns);
}

export function dueReservations(sql: Knex, now: number): Promise<Reservation[]> {
  return sql('reservations')
    .where({ state: 'reserved' })
    .andWhere('expires_at', '<=', now)
    .orderBy('expires_at')
    .select<Reservation[]>(...reservationColumns);
}

/** Moves a reservation on; false when somebody else did so first. */
export async function changeReservation(
  sql: Knex.Transaction,
  id: string,
  from: ReservationState,
  to: ReservationState,
): Promise<boolean> {
  return (await sql('reservations').where({ id, state: from }).update({ state: to })) === 1;
}

export async function reservationLines(sql: Knex, reservationId: string): Promise<Map<string, number>> {
  const lines = await sql('reservation_lines')
    .where({ reservation_id: reservationId })
    .select<{ partId: string; quantity: number }[]>('part_id as partId', 'quantity');
  return new Map(lines.map((line) => [line.partId, line.quantity]));
}

export async function insertReservation(
  sql: Knex.Transaction,
  reservation: Reservation,
  lines: ReadonlyMap<string, number>,
): Promise<void> {
  await sql('reservations').insert({
    id: reservation.id,
    order_id: reservation.orderId,
    state: reservation.state,
    expires_at: reservation.expiresAt,
  });
  for (const [partId, quantity] of lines) {
    await sql('reservation_lines').insert({ reservation_id: reservation.id, part_id: partId, quantity });
  }
}

/** Takes from or adds to what an order still has set aside of a part; false when there is not that much. */
export async function changeReservationLine(
  sql: Knex.Transaction,
  reservationId: string,
  partId: string,
  by: number,
): Promise<boolean> {
  const changed = await sql('reservation_lines')
    .where({ reservation_id: reservationId, part_id: partId })
    .andWhere('quantity', '>=', Math.max(0, -by))
    .increment('quantity', by);
  return changed === 1;
}

/** Available by part id as the sums say; reservations that are due but not yet given back still count as reserved. */
export async function availableRows(sql: Knex, partIds: readonly string[]): Promise<Map<string, number>> {
  const stock = await sql('part_stock')
    .whereIn('part_id', [...partIds])
    .select<{ partId: string; accepted: number; reserved: number; allocated: number }[]>(
      'part_id as partId',
      'accepted',
      'reserved',
      'allocated',
    );
  const known = new Map(stock.map((row) => [row.partId, availableFrom(row)]));
  return new Map(partIds.map((id) => [id, known.get(id) ?? 0]));
}

/** What due reservations hold of each part: it may be promised again. */
export async function heldByDue(sql: Knex, now: number): Promise<Map<string, number>> {
  const lines = await sql('reservations')
    .join('reservation_lines', 'reservation_lines.reservation_id', 'reservations.id')
    .where({ 'reservations.state': 'reserved' })
    .andWhere('reservations.expires_at', '<=', now)
    .select<{ partId: string; quantity: number }[]>(
      'reservation_lines.part_id as partId',
      'reservation_lines.quantity as quantity',
    );
  const held = new Map<string, number>();
  for (const { partId, quantity } of lines) held.set(partId, (held.get(partId) ?? 0) + quantity);
  return held;
}

/** Live reservations and allocations that hold something of a part: reservations first, the youngest order first. */
export async function promisesOf(sql: Knex, partId: string): Promise<Reservation[]> {
  const live = await sql('reservations')
    .join('reservation_lines', 'reservation_lines.reservation_id', 'reservations.id')
    .join('orders', 'orders.id', 'reservations.order_id')
    .where({ 'reservation_lines.part_id': partId })
    .andWhere('reservation_lines.quantity', '>', 0)
    .whereIn('reservations.state', ['reserved', 'allocated'])
    .orderBy([
      { column: 'orders.placed_at', order: 'desc' },
      { column: 'orders.id', order: 'desc' },
    ])
    .select<Reservation[]>(
      'reservations.id as id',
      'reservations.order_id as orderId',
      'reservations.state as state',
      'reservations.expires_at as expiresAt',
    );
  return [...live.filter((one) => one.state === 'reserved'), ...live.filter((one) => one.state === 'allocated')];
}

/** What a paid order still has set aside of a part. */
export async function allocatedLine(
  sql: Knex,
  orderId: string,
  partId: string,
): Promise<{ reservationId: string; quantity: number } | undefined> {
  return sql('reservations')
    .join('reservation_lines', 'reservation_lines.reservation_id', 'reservations.id')
    .where({ 'reservations.order_id': orderId, 'reservations.state': 'allocated', 'reservation_lines.part_id': partId })
    .first<{ reservationId: string; quantity: number }>(
      'reservations.id as reservationId',
      'reservation_lines.quantity as quantity',
    );
}

export async function markUsedWhenEmpty(sql: Knex.Transaction, reservationId: string): Promise<void> {
  const left = await sql('reservation_lines')
    .where({ reservation_id: reservationId })
    .andWhere('quantity', '>', 0)
    .first<{ part_id: string }>('part_id');
  if (!left) await changeReservation(sql, reservationId, 'allocated', 'used');
}

/** The order's allocation, taken into use again after everything had been picked. */
export async function reopenAllocation(sql: Knex.Transaction, orderId: string): Promise<string | undefined> {
  const live = await liveReservation(sql, orderId);
  if (live) return live.state === 'allocated' ? live.id : undefined;
  const used = await usedReservation(sql, orderId);
  if (!used) return undefined;
  await changeReservation(sql, used.id, 'used', 'allocated');
  return used.id;
}
