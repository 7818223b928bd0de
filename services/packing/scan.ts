import { type Actor, must, personIdOf } from '../access';
import { parse } from '../problem';
import { type Tx, record, write } from '../record';
import { pick } from '../stock';
import { boxView } from './box-view';
import { boxInHands } from './in-hands';
import { type BoxRow, insertPick, keepClaim, setPacked } from './rows';
import { amountText, lowerFirst } from './rules';
import { type Judged, type Placed, judge } from './judge';
import { Scan, type ScanAnswer } from './schemas';

/**
 * Answers one scan: a right lot goes into the box and out of the store in one transaction; anything else is refused in
 * words and leaves the box as it was. A wrong scan is no error, so it stays in the record of changes.
 */
export async function scan(actor: Actor, input: Scan): Promise<ScanAnswer> {
  must(actor, 'box.pack');
  const { boxId, code, pieces } = parse(Scan, input);

  return write(actor, async (tx) => {
    const box = await boxInHands(tx, boxId);
    const judged = await judge(tx.sql, box, code, pieces);
    const answer = await apply(tx, box, judged);
    if (!judged.right) {
      await record(tx, 'box.scan-refused', {
        subject: { kind: 'box', id: boxId },
        after: { code, sentence: answer.sentence },
      });
    }
    return { ...answer, right: judged.right, at: tx.now, box: await boxView(tx.sql, actor, boxId, tx.now) };
  });
}

type Answer = Pick<ScanAnswer, 'title' | 'sentence' | 'lineId' | 'rest'>;

async function apply(tx: Tx, box: BoxRow, judged: Judged): Promise<Answer> {
  if (!judged.right) return { title: judged.title, sentence: judged.sentence, lineId: null, rest: null };
  if (judged.what === 'guide') return scanGuide(tx, box);
  return putIn(tx, box, judged);
}

async function scanGuide(tx: Tx, box: BoxRow): Promise<Answer> {
  await keepClaim(tx, box.id, personIdOf(tx.actor) ?? '', {
    guide_scanned_at: tx.now,
    // A guide that can be scanned has been printed, whether or not anybody said so.
    guide_printed_at: box.guidePrintedAt ?? tx.now,
  });
  await record(tx, 'box.guide-scanned', { subject: { kind: 'box', id: box.id }, after: { serial: box.serial } });
  return {
    title: `Right: guide ${box.kitNumber} ${box.letter}`,
    sentence: 'It is of this version and made for this box. Lay it on top.',
    lineId: null,
    rest: null,
  };
}

async function putIn(tx: Tx, box: BoxRow, { line, lot, quantity }: Placed): Promise<Answer> {
  const packed = line.packed + quantity;
  const place = { partId: line.partId, lotId: lot.lotId, binId: lot.binId, quantity };
  await pick(tx, { orderId: box.orderId, ...place, document: box.serial });
  await insertPick(tx, { boxId: box.id, lineId: line.id, ...place, personId: personIdOf(tx.actor) ?? '' });
  await setPacked(tx, line, packed);
  // What the scale said before this piece went in says nothing now.
  if (box.weighedMilligrams !== null) {
    await keepClaim(tx, box.id, personIdOf(tx.actor) ?? '', { weighed_milligrams: null });
  }
  await record(tx, 'box.picked', {
    subject: { kind: 'box', id: box.id },
    before: { reference: line.reference, packed: line.packed },
    after: { reference: line.reference, packed, lot: lot.lotCode, bin: lot.binCode },
  });
  const name = lowerFirst(line.name);
  const left = line.needed - packed;
  const more = line.unit === 'each' ? Math.min(left, lot.onHand - quantity) : 0;
  const count = line.unit === 'each' ? `${packed} of ${line.needed}` : amountText(line.needed, line.unit);
  return {
    title: `Right: ${name}, ${count}`,
    sentence: left === 0 ? 'Set it in the box.' : `${amountText(left, line.unit)} more to come.`,
    lineId: line.id,
    rest: more > 0 ? { code: lot.lotCode, pieces: more } : null,
  };
}
