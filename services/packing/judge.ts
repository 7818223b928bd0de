import type { Knex } from 'knex';
import { frozenContent } from '../kits';
import { type LotOfPart, type LotRow, findLot, findPart, lotsOf } from './lot-rows';
import { type BoxLineRow, type BoxRow, linesOf } from './rows';
import { amountText, isIn, lowerFirst, suggest, versionName } from './rules';
import { isSerial, looksLikeSerial, readGuideCode, shortHash } from './serial';

export interface Placed {
  right: true;
  what: 'part';
  line: BoxLineRow;
  lot: LotOfPart;
  quantity: number;
}
export interface Wrong {
  right: false;
  title: string;
  sentence: string;
}
export type Judged = Placed | { right: true; what: 'guide' } | Wrong;

const wrong = (title: string, sentence: string): Wrong => ({ right: false, title: `Wrong: ${title}`, sentence });

/** Decides what a scanned or typed code is and whether it belongs into this box now. Changes nothing. */
export async function judge(sql: Knex, box: BoxRow, code: string, pieces: number): Promise<Judged> {
  if (readGuideCode(code)) return judgeGuide(sql, box, code);
  const lot = await findLot(sql, code);
  const lines = await linesOf(sql, [box.id]);
  if (lot) return judgeLot(sql, box, lines, lot, pieces);
  const part = await findPart(sql, code);
  if (part) return judgePart(sql, box, lines, part, pieces);
  if (isSerial(code)) {
    return code === box.serial
      ? wrong('the box itself', 'That is the serial of this box. Scan the label of the next lot.')
      : wrong('another box', `That is box ${code}; this is ${box.serial}. Scan the label of a lot.`);
  }
  if (looksLikeSerial(code)) return wrong('read badly', 'The check character does not fit. Scan it again.');
  return wrong('unknown code', `Nothing here has the code ${code}. Scan the lot's label again, or type it.`);
}

async function judgeGuide(sql: Knex, box: BoxRow, code: string): Promise<Judged> {
  const guide = readGuideCode(code);
  const { contentHash } = await frozenContent(sql, box.versionId);
  const mine = versionName(box);
  if (guide?.hash !== shortHash(contentHash)) {
    return wrong(
      'guide of another version',
      `This box is ${mine}, and its guide begins G${shortHash(contentHash)}. Print the guide of this box.`,
    );
  }
  if (guide.serial !== box.serial) {
    return wrong(
      'guide of another box',
      `The version is right, but it was printed for ${guide.serial}. This is ${box.serial}.`,
    );
  }
  return { right: true, what: 'guide' };
}

async function judgeLot(sql: Knex, box: BoxRow, lines: BoxLineRow[], lot: LotRow, pieces: number): Promise<Judged> {
  const mine = lines.filter((line) => line.partId === lot.partId);
  const name = lowerFirst(lot.name);
  if (mine.length === 0) {
    return wrong(
      'not in this box',
      `Lot ${lot.code} is ${name}. Version ${versionName(box)} has none of it. Put it back.`,
    );
  }
  if (lot.state === 'blocked')
    return wrong(
      'blocked lot',
      `Lot ${lot.code} is blocked, so nobody may use it. ${instead(await otherLot(sql, mine, lot))}`,
    );
  if (lot.state === 'quarantine') {
    return wrong(
      'not inspected',
      `Lot ${lot.code} has not passed its inspection. ${instead(await otherLot(sql, mine, lot))}`,
    );
  }
  const line = mine.find((one) => !isIn(one));
  if (!line) {
    const count = mine.reduce((sum, one) => sum + one.needed, 0);
    const unit = mine[0]?.unit ?? 'each';
    return wrong('already complete', `All ${amountText(count, unit)} of ${name} are in. Put it back.`);
  }
  const quantity = line.unit === 'each' ? pieces : line.needed - line.packed;
  if (quantity > line.needed - line.packed) {
    return wrong('too many', `Only ${amountText(line.needed - line.packed, line.unit)} more of ${name} go in.`);
  }
  const here = (await lotsOf(sql, [lot.partId])).filter((one) => one.lotId === lot.id && one.onHand >= quantity);
  const place = suggest(here, line) ?? here[0];
  if (!place) {
    return wrong(
      'not that much left',
      `The books show less than ${amountText(quantity, line.unit)} of lot ${lot.code} in any bin. Take another lot, and have this one counted.`,
    );
  }
  return { right: true, what: 'part', line, lot: place, quantity };
}

const otherLot = async (sql: Knex, lines: readonly BoxLineRow[], not: LotRow): Promise<LotOfPart | null> => {
  const line = lines.find((one) => !isIn(one)) ?? lines[0];
  if (!line) return null;
  const lots = (await lotsOf(sql, [line.partId])).filter((lot) => lot.lotId !== not.id);
  return lots.find((lot) => suggest([lot], line) !== null) ?? null;
};

const instead = (lot: LotOfPart | null) =>
  lot ? `Take lot ${lot.lotCode} from bin ${lot.binCode}.` : 'Put it back and tell the store: no other lot is here.';

/** A typed part code stands for its lot when the bin to fetch from holds exactly one accepted lot of it. */
async function judgePart(
  sql: Knex,
  box: BoxRow,
  lines: BoxLineRow[],
  part: { id: string; code: string; name: string },
  pieces: number,
): Promise<Judged> {
  const line = lines.find((one) => one.partId === part.id && !isIn(one)) ?? lines.find((one) => one.partId === part.id);
  if (!line) {
    return wrong(
      'not in this box',
      `${part.code} is ${lowerFirst(part.name)}. Version ${versionName(box)} has none of it. Put it back.`,
    );
  }
  const lots = await lotsOf(sql, [part.id]);
  const next = suggest(lots, line);
  const inBin = next ? lots.filter((lot) => lot.binId === next.binId) : [];
  const [only] = inBin;
  if (!only) return wrong('none in store', `No accepted lot of ${part.code} lies in a bin. Tell the store.`);
  if (inBin.length > 1) {
    return wrong(
      'which lot?',
      `${inBin.length} lots of ${part.code} lie in bin ${only.binCode}. Scan the label of the lot you hold.`,
    );
  }
  const lot = await findLot(sql, only.lotCode);
  return lot ? judgeLot(sql, box, lines, lot, pieces) : wrong('unknown code', `Scan the label of the lot.`);
}
