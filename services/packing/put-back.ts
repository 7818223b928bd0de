import { type Actor, must, personIdOf } from '../access';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import { putBack as returnToBin } from '../stock';
import { boxView } from './box-view';
import { boxInHands } from './in-hands';
import { inBox } from './lot-rows';
import { insertPick, keepClaim, linesOf, setPacked } from './rows';
import { lowerFirst } from './rules';
import { type BoxView, PutBack } from './schemas';

/**
 * Takes the last piece of a line out of the box again and back into the bin it came from: a counter-movement, never a
 * correction of the first. A blocked lot's pieces go first, so that they can be exchanged.
 */
export async function putBack(actor: Actor, input: PutBack): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId, lineId } = parse(PutBack, input);

  return write(actor, async (tx) => {
    const box = await boxInHands(tx, boxId, { emptying: true });
    const line = (await linesOf(tx.sql, [boxId])).find((one) => one.id === lineId);
    const lying = (await inBox(tx.sql, boxId)).filter((one) => one.lineId === lineId);
    const last = lying.find((one) => one.lotState !== 'accepted') ?? lying[0];
    if (!line || !last) throw refused(`Nothing of ${line ? lowerFirst(line.name) : 'that line'} is in the box.`);

    const quantity = line.unit === 'each' ? 1 : last.quantity;
    const place = { partId: line.partId, lotId: last.lotId, binId: last.binId };
    await returnToBin(tx, { orderId: box.orderId, ...place, quantity, document: box.serial });
    await insertPick(tx, { boxId, lineId, ...place, quantity: -quantity, personId: personIdOf(actor) ?? '' });
    await setPacked(tx, line, line.packed - quantity);
    await keepClaim(tx, boxId, personIdOf(actor) ?? '', { weighed_milligrams: null });
    await record(tx, 'box.put-back', {
      subject: { kind: 'box', id: boxId },
      before: { reference: line.reference, packed: line.packed },
      after: { reference: line.reference, packed: line.packed - quantity, lot: last.lotCode },
    });
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
