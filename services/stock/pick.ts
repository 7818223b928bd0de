import { personIdOf } from '../access';
import { newId } from '../ids';
import { missing, refused } from '../problem';
import type { Tx } from '../record';
import { sayQuantity } from './rules';
import * as rows from './rows';

export interface Pick {
  orderId: string;
  partId: string;
  lotId: string;
  binId: string;
  /** Base units: pieces, millimetres, milligrams. */
  quantity: number;
  /** The box it goes into. */
  document: string;
}

/**
 * Takes a part out of its bin for an order. Refused for a lot of another part, one that is not accepted, or a bin that
 * holds less. What the order has set aside is used first, then what is available.
 */
export async function pick(tx: Tx, input: Pick): Promise<void> {
  const { part, lot } = await partAndLot(tx, input);
  if (lot.state !== 'accepted') {
    throw refused(`Lot ${lot.code} is ${lot.state === 'blocked' ? 'blocked' : 'not inspected yet'}. Take another lot.`);
  }
  const { quantity } = input;
  const aside = await rows.allocatedLine(tx.sql, input.orderId, input.partId);
  const fromAside = Math.min(quantity, aside?.quantity ?? 0);
  const moved = await rows.move(tx.sql, {
    ...movement(tx, input, lot),
    kind: 'pick',
    quantity: -quantity,
    reason: 'packed',
  });
  if (!moved) {
    throw refused(
      `The bin does not hold ${sayQuantity(quantity, part.unit)} of lot ${lot.code}. Count it, or take another lot.`,
    );
  }
  if (!(await rows.changeStock(tx.sql, part.id, { accepted: -quantity, allocated: -fromAside }))) {
    throw refused(`What is left of ${part.code} is promised to other orders. Ask the owner which order goes first.`);
  }
  if (aside && fromAside > 0) {
    await rows.changeReservationLine(tx.sql, aside.reservationId, part.id, -fromAside);
    await rows.markUsedWhenEmpty(tx.sql, aside.reservationId);
  }
}

/** Puts a picked part back where it came from; the order keeps it set aside if its lot may still be used. */
export async function putBack(tx: Tx, input: Pick): Promise<void> {
  const { part, lot } = await partAndLot(tx, input);
  await rows.move(tx.sql, {
    ...movement(tx, input, lot),
    kind: 'pick-return',
    quantity: input.quantity,
    reason: 'put back',
  });
  const accepted = lot.state === 'accepted' ? input.quantity : 0;
  await rows.changeStock(tx.sql, part.id, { accepted });
  const aside = await rows.reopenAllocation(tx.sql, input.orderId);
  if (!aside) return;
  const isAside = await rows.changeStock(tx.sql, part.id, { allocated: input.quantity });
  if (isAside) await rows.changeReservationLine(tx.sql, aside, part.id, input.quantity);
}

async function partAndLot(tx: Tx, { partId, lotId }: Pick) {
  const part = await rows.findPart(tx.sql, partId);
  const lot = await rows.findLot(tx.sql, lotId);
  if (!part || !lot) throw missing('This lot is not in the store. Scan its label again.');
  if (lot.partId !== part.id) throw refused(`Lot ${lot.code} is not ${part.code}. Put it back.`);
  return { part, lot };
}

const movement = (tx: Tx, input: Pick, lot: rows.LotRow) => ({
  id: newId(),
  at: tx.now,
  partId: input.partId,
  lotId: input.lotId,
  binId: input.binId,
  document: input.document,
  personId: personIdOf(tx.actor),
  unitCostMinor: lot.unitCostMinor,
});
