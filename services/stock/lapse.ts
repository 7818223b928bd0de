import { type Tx, record } from '../record';
import * as rows from './rows';

/**
 * Gives back every reservation whose time is over, and names their orders. Called first wherever stock is promised, so
 * that a lapsed reservation has no effect even before the worker has come by.
 */
export async function lapseDue(tx: Tx): Promise<string[]> {
  const due = await rows.dueReservations(tx.sql, tx.now);
  for (const reservation of due) await release(tx, reservation, 'lapsed');
  return due.map((reservation) => reservation.orderId);
}

/** Ends a live reservation and takes what is left of it out of the part's sums. */
export async function release(tx: Tx, reservation: rows.Reservation, to: 'lapsed' | 'given-back'): Promise<void> {
  const { id, state } = reservation;
  if (state !== 'reserved' && state !== 'allocated') return;
  if (!(await rows.changeReservation(tx.sql, id, state, to))) return;
  for (const [partId, quantity] of await rows.reservationLines(tx.sql, id)) {
    if (quantity > 0 && !(await rows.changeStock(tx.sql, partId, { [state]: -quantity }))) {
      throw new Error(`The sums of part ${partId} do not carry its reservations.`);
    }
  }
  await record(tx, `stock.${to}`, {
    subject: { kind: 'order', id: reservation.orderId },
    before: { stock: state },
    after: { stock: to },
  });
}

/** Gives an order's stock back: its reservation when payment did not come, its allocation when it is cancelled. */
export async function giveBack(tx: Tx, orderId: string, why: 'lapsed' | 'given-back'): Promise<void> {
  const live = await rows.liveReservation(tx.sql, orderId);
  if (!live) return;
  // A lapse is about payment that did not come; what is allocated was paid.
  if (why === 'lapsed' && live.state === 'allocated') return;
  await release(tx, live, why);
}
