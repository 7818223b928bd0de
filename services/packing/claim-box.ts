import { type Actor, must, personIdOf } from '../access';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import { claim, getBox, moveOrder } from './rows';
import { takenSentence, barOf } from './rules';
import { type BoxView, ClaimBox } from './schemas';
import { boxView } from './box-view';

/**
 * Takes a box to pack. Of two packers exactly one gets it; a claim that has lapsed is taken over, with a line in the
 * record. The first box of an order moves the order to "picking".
 */
export async function claimBox(actor: Actor, input: ClaimBox): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId } = parse(ClaimBox, input);

  return write(actor, async (tx) => {
    const box = await getBox(tx.sql, boxId);
    const bar = barOf(box);
    if (bar !== '') throw refused(bar);
    if (!['allocated', 'picking', 'packed'].includes(box.fulfilment)) {
      throw refused(`Order ${box.orderNumber} is ${box.fulfilment}, so its boxes stay empty. Take the next one.`);
    }
    const personId = personIdOf(actor) ?? '';
    if (!(await claim(tx, boxId, personId))) {
      throw refused(
        box.claimedAt === null
          ? `Box ${box.serial} is closed already. Take the next one.`
          : takenSentence(box.serial, box.claimedName ?? 'Somebody', box.claimedAt),
      );
    }
    if (await moveOrder(tx, box.orderId, 'allocated', 'picking')) {
      await record(tx, 'order.picking', {
        subject: { kind: 'order', id: box.orderId },
        before: { fulfilment: 'allocated' },
        after: { fulfilment: 'picking' },
      });
    }
    const tookOver = box.claimedBy !== null && box.claimedBy !== personId;
    await record(tx, tookOver ? 'box.taken-over' : 'box.claimed', {
      subject: { kind: 'box', id: boxId },
      before: { claimedBy: box.claimedBy, claimedAt: box.claimedAt },
      after: { claimedBy: personId, claimedAt: tx.now },
    });
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
