import { newId } from '../ids';
import { refused } from '../problem';
import type { Tx } from '../record';
import type { Instant } from '../time';
import { lapseDue } from './lapse';
import { availableFrom, sayQuantity } from './rules';
import * as rows from './rows';

export interface Reserve {
  orderId: string;
  /** Base units by part id. */
  needs: ReadonlyMap<string, number>;
  expiresAt: Instant;
}

/**
 * Sets stock aside for an order while its buyer pays: for all parts or for none. An order that has a live reservation
 * keeps it, until the later of the two times. Throws what is refused, which rolls the caller's transaction back.
 */
export async function reserve(tx: Tx, { orderId, needs, expiresAt }: Reserve): Promise<void> {
  await lapseDue(tx);
  const live = await rows.liveReservation(tx.sql, orderId);
  if (live) {
    if (live.state === 'reserved' && live.expiresAt < expiresAt) {
      await tx.sql('reservations').where({ id: live.id, state: 'reserved' }).update({ expires_at: expiresAt });
    }
    return;
  }
  for (const [partId, quantity] of needs) {
    if (!(await rows.changeStock(tx.sql, partId, { reserved: quantity }))) throw await tooFew(tx, partId, quantity);
  }
  await rows.insertReservation(tx.sql, { id: newId(), orderId, state: 'reserved', expiresAt }, needs);
}

async function tooFew(tx: Tx, partId: string, quantity: number) {
  const part = await rows.findPart(tx.sql, partId);
  const stock = await tx
    .sql('part_stock')
    .where({ part_id: partId })
    .first<{ accepted: number; reserved: number; allocated: number }>('accepted', 'reserved', 'allocated');
  const left = stock ? availableFrom(stock) : 0;
  const unit = part?.unit ?? 'each';
  return refused(
    `The store has ${sayQuantity(left, unit)} of ${part?.code ?? 'a part'} ${part?.name ?? ''} left, and this needs ${sayQuantity(quantity, unit)}. Choose fewer kits.`,
  );
}
