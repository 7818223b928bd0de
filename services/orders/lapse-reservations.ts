import { type Actor, must } from '../access';
import { record, write } from '../record';
import { allocate, lapseDue } from '../stock';
import * as rows from './rows';

/**
 * Gives back what buyers did not pay in time, then serves paid orders that wait for stock, oldest payment first.
 * @returns the orders whose reservation lapsed, and those that got their stock
 */
export async function lapseReservations(actor: Actor): Promise<{ lapsed: string[]; served: string[] }> {
  must(actor, 'order.lapse');
  return write(actor, async (tx) => {
    const lapsed = await lapseDue(tx);
    const served: string[] = [];
    for (const order of await rows.backordered(tx.sql)) {
      if ((await allocate(tx, order.id)) !== 'allocated') continue;
      await rows.moveOrder(tx.sql, order, { fulfilment: 'allocated' });
      await record(tx, 'order.served', {
        subject: { kind: 'order', id: order.id },
        before: { fulfilment: 'backordered' },
        after: { fulfilment: 'allocated' },
      });
      served.push(order.id);
    }
    return { lapsed, served };
  });
}
