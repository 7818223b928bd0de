import { type Actor, must } from '../access';
import { missing, parse, refused } from '../problem';
import { record, write } from '../record';
import { findLot, takeOut } from '../stock';
import { BlockLot } from '../stock/schemas';
import { tellOfShortage } from './mark-paid';
import { lookAt } from './look-at';
import * as rows from './rows';
import { fulfilmentMayBecome } from './rules';

/**
 * Blocks a lot: nobody may pick from it. Orders that were promised what is no longer there wait for stock again, the
 * youngest first, and their buyers and the owner are told.
 */
export async function blockLot(actor: Actor, input: BlockLot): Promise<{ waiting: number }> {
  must(actor, 'stock.block');
  const { lotId, reason } = parse(BlockLot, input);

  return write(actor, async (tx) => {
    const lot = await findLot(tx.sql, lotId);
    if (!lot) throw missing('This lot is not in the store.');
    if (lot.state === 'blocked') throw refused(`Lot ${lot.code} is blocked already.`);
    const { unallocated } = await takeOut(tx, lot);
    for (const orderId of unallocated) {
      const order = await rows.getOrder(tx.sql, orderId);
      if (!fulfilmentMayBecome(order.fulfilment, 'backordered')) {
        await lookAt(tx, orderId, `Lot ${lot.code} was blocked while this order was being packed.`);
        continue;
      }
      await rows.moveOrder(tx.sql, order, { fulfilment: 'backordered' });
      await tellOfShortage(tx, orderId);
      await record(tx, 'order.backordered', {
        subject: { kind: 'order', id: orderId },
        before: { fulfilment: order.fulfilment },
        after: { fulfilment: 'backordered' },
        reason: `lot ${lot.code} was blocked`,
      });
    }
    await record(tx, 'lot.blocked', {
      subject: { kind: 'lot', id: lotId },
      before: { state: lot.state },
      after: { state: 'blocked', waiting: unallocated },
      reason,
    });
    return { waiting: unallocated.length };
  });
}
