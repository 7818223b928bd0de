import { type Actor, must, personIdOf } from '../access';
import { parse, refuseIfAny } from '../problem';
import { record, write } from '../record';
import { boxView } from './box-view';
import { boxInHands } from './in-hands';
import { keepClaim, linesOf } from './rows';
import { countPieces, pieces } from './rules';
import { type BoxView, MarkPrinted } from './schemas';

/** Notes that the packer holds the printed slip or guide. A slip lists what was scanned, so all of it is in first. */
export async function markPrinted(actor: Actor, input: MarkPrinted): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId, paper } = parse(MarkPrinted, input);

  return write(actor, async (tx) => {
    const box = await boxInHands(tx, boxId);
    if (paper === 'slip') {
      const { packed, needed } = countPieces(await linesOf(tx.sql, [boxId]));
      refuseIfAny(
        packed < needed ? [`The slip lists what is in the box, and ${pieces(needed - packed)} are still to go.`] : [],
      );
    }
    const column = paper === 'slip' ? 'slip_printed_at' : 'guide_printed_at';
    await keepClaim(tx, boxId, personIdOf(actor) ?? '', { [column]: tx.now });
    await record(tx, `box.${paper}-printed`, { subject: { kind: 'box', id: boxId }, after: { serial: box.serial } });
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
