import { type Actor, must } from '../access';
import { parse, refused } from '../problem';
import { record, write } from '../record';
import { boxView } from './box-view';
import { boxInHands } from './in-hands';
import { lotsOf } from './lot-rows';
import { linesOf, markToldEmpty } from './rows';
import { isIn, lowerFirst, suggest } from './rules';
import { type BoxView, TellEmpty } from './schemas';

/** Says that the suggested bin is empty although the books show stock: the record keeps it, the tray goes to another lot. */
export async function tellEmpty(actor: Actor, input: TellEmpty): Promise<BoxView> {
  must(actor, 'box.pack');
  const { boxId, lineId } = parse(TellEmpty, input);

  return write(actor, async (tx) => {
    await boxInHands(tx, boxId);
    const line = (await linesOf(tx.sql, [boxId])).find((one) => one.id === lineId);
    if (!line || isIn(line)) throw refused('That line is in the box already.');
    const lot = suggest(await lotsOf(tx.sql, [line.partId]), line);
    if (!lot) throw refused(`The store knows already that no ${lowerFirst(line.name)} is left.`);
    await markToldEmpty(tx, line.id, lot.binId);
    await record(tx, 'bin.told-empty', {
      subject: { kind: 'bin', id: lot.binId },
      after: { bin: lot.binCode, part: line.partCode, lot: lot.lotCode, booked: lot.onHand },
    });
    return boxView(tx.sql, actor, boxId, tx.now);
  });
}
