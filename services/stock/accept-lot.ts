import { type Actor, must } from '../access';
import { missing, parse, refused } from '../problem';
import { record, write } from '../record';
import { AcceptLot } from './schemas';
import * as rows from './rows';

/** Lets a lot be used after it was looked at: from quarantine, or by a checker after a block. */
export async function acceptLot(actor: Actor, input: AcceptLot): Promise<void> {
  must(actor, 'stock.read');
  const { lotId, reason } = parse(AcceptLot, input);

  await write(actor, async (tx) => {
    const lot = await rows.findLot(tx.sql, lotId);
    if (!lot) throw missing('This lot is not in the store.');
    if (lot.state === 'accepted') throw refused(`Lot ${lot.code} is accepted already.`);
    must(actor, lot.state === 'blocked' ? 'stock.block' : 'stock.receive');
    await tx.sql('lots').where({ id: lotId, state: lot.state }).update({ state: 'accepted' });
    await rows.changeStock(tx.sql, lot.partId, { accepted: await rows.onHandOfLot(tx.sql, lotId) });
    await record(tx, 'lot.accepted', {
      subject: { kind: 'lot', id: lotId },
      before: { state: lot.state },
      after: { state: 'accepted' },
      reason,
    });
  });
}
