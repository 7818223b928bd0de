import { type Actor, must, personIdOf } from '../access';
import { frozenContent } from '../kits';
import { parse, refuseIfAny, refused } from '../problem';
import { record, write } from '../record';
import { blockersOf, boxView } from './box-view';
import { boxInHands } from './in-hands';
import { inBox } from './lot-rows';
import { hasOpenBoxes, linesOf, moveOrder, setClosed } from './rows';
import { weighing } from './mass';
import { type BoxView, CloseBox } from './schemas';

/**
 * Puts the lid on. Refused with every reason at once: a line missing, a blocked lot, guide or slip missing, the mass
 * outside its limits, the version no longer released or its content changed. The last box of an order packs the order.
 */
export async function closeBox(actor: Actor, input: CloseBox): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId } = parse(CloseBox, input);

  return write(actor, async (tx) => {
    const box = await boxInHands(tx, boxId);
    const { content, contentHash } = await frozenContent(tx.sql, box.versionId);
    const lines = await linesOf(tx.sql, [boxId]);
    const mass = weighing(box.expectedMilligrams, box.weighedMilligrams, content);
    refuseIfAny(blockersOf(box, lines, await inBox(tx.sql, boxId), mass));

    const personId = personIdOf(actor) ?? '';
    if (!(await setClosed(tx, boxId, personId))) throw refused('This box left your hands. Look for it under Boxes.');
    await record(tx, 'box.closed', {
      subject: { kind: 'box', id: boxId },
      before: { state: 'packing' },
      after: { state: 'closed', contentHash, weighed: box.weighedMilligrams },
    });
    if (!(await hasOpenBoxes(tx.sql, box.orderId)) && (await moveOrder(tx, box.orderId, 'picking', 'packed'))) {
      await record(tx, 'order.packed', {
        subject: { kind: 'order', id: box.orderId },
        before: { fulfilment: 'picking' },
        after: { fulfilment: 'packed' },
      });
    }
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
