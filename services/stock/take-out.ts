import type { Tx } from '../record';
import { release } from './lapse';
import * as rows from './rows';

/**
 * Takes an accepted lot out of use. What is left may not carry all that was promised: then the youngest reservations,
 * and after them the youngest allocations, are given back until it does.
 * @returns the orders that lost their reservation or allocation
 */
export async function takeOut(tx: Tx, lot: rows.LotRow): Promise<{ unreserved: string[]; unallocated: string[] }> {
  const displaced = { unreserved: new Array<string>(), unallocated: new Array<string>() };
  await tx.sql('lots').where({ id: lot.id, state: lot.state }).update({ state: 'blocked' });
  if (lot.state !== 'accepted') return displaced;

  const quantity = await rows.onHandOfLot(tx.sql, lot.id);
  const promised = await rows.promisesOf(tx.sql, lot.partId);
  for (let next = promised.shift(); ; next = promised.shift()) {
    if (await rows.changeStock(tx.sql, lot.partId, { accepted: -quantity })) return displaced;
    if (!next) throw new Error(`The sums of part ${lot.partId} do not carry its lots.`);
    await release(tx, next, 'given-back');
    (next.state === 'reserved' ? displaced.unreserved : displaced.unallocated).push(next.orderId);
  }
}
