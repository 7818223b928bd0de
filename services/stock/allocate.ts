import { newId } from '../ids';
import type { Tx } from '../record';
import { lapseDue } from './lapse';
import * as rows from './rows';

export type Allocation = 'allocated' | 'backordered';

/**
 * Turns an order's reservation into an allocation, once it is paid. Where the reservation has lapsed it takes what is
 * available, for all parts or for none: never below zero. Asked again it changes nothing.
 */
export async function allocate(tx: Tx, orderId: string): Promise<Allocation> {
  await lapseDue(tx);
  const live = await rows.liveReservation(tx.sql, orderId);
  if (live?.state === 'allocated') return 'allocated';
  if (live) {
    const lines = await rows.reservationLines(tx.sql, live.id);
    await rows.changeReservation(tx.sql, live.id, 'reserved', 'allocated');
    for (const [partId, quantity] of lines) {
      await mustChange(tx, partId, { reserved: -quantity, allocated: quantity });
    }
    return 'allocated';
  }
  if (await rows.usedReservation(tx.sql, orderId)) return 'allocated';
  const last = await rows.lastReservation(tx.sql, orderId);
  if (!last) return 'backordered';
  const needs = await rows.reservationLines(tx.sql, last.id);
  if (!(await isAvailable(tx, needs))) return 'backordered';
  for (const [partId, quantity] of needs) await mustChange(tx, partId, { allocated: quantity });
  await rows.insertReservation(tx.sql, { id: newId(), orderId, state: 'allocated', expiresAt: tx.now }, needs);
  return 'allocated';
}

async function isAvailable(tx: Tx, needs: ReadonlyMap<string, number>): Promise<boolean> {
  const available = await rows.availableRows(tx.sql, [...needs.keys()]);
  return [...needs].every(([partId, quantity]) => (available.get(partId) ?? 0) >= quantity);
}

/** The write lock is held, so what was looked at still stands; anything else is a fault of ours and undoes all. */
async function mustChange(tx: Tx, partId: string, change: rows.StockChange): Promise<void> {
  if (!(await rows.changeStock(tx.sql, partId, change))) {
    throw new Error(`The sums of part ${partId} do not carry its reservations.`);
  }
}
