import { type Actor, must, personIdOf } from '../access';
import { parse, refuseIfAny } from '../problem';
import { record, write } from '../record';
import { boxView } from './box-view';
import { boxInHands } from './in-hands';
import { keepClaim, linesOf } from './rows';
import { massLimits } from './mass';
import { countPieces, pieces } from './rules';
import { type BoxView, Weigh } from './schemas';

/** Takes the scale's reading of the full box. Outside the limits it stays on record and asks for another weighing. */
export async function weigh(actor: Actor, input: Weigh): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId, milligrams } = parse(Weigh, input);

  return write(actor, async (tx) => {
    const box = await boxInHands(tx, boxId);
    const { packed, needed } = countPieces(await linesOf(tx.sql, [boxId]));
    refuseIfAny(packed < needed ? [`Weigh the box when everything is in: ${pieces(needed - packed)} to go.`] : []);
    await keepClaim(tx, boxId, personIdOf(actor) ?? '', { weighed_milligrams: milligrams });
    await record(tx, 'box.weighed', {
      subject: { kind: 'box', id: boxId },
      before: { milligrams: box.weighedMilligrams },
      after: { milligrams, expected: box.expectedMilligrams, ...massLimits(box.expectedMilligrams) },
    });
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
