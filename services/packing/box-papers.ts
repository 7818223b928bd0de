import type { Knex } from 'knex';
import { type Actor, can } from '../access';
import { readSignOff } from '../check';
import { readFrozen } from '../kits';
import type { VersionContent, VersionState } from '../kits/schemas';
import { missing, refused } from '../problem';
import type { Verdict } from '../receiver';
import { reading, sha256 } from '../record';
import { plateOf } from './box-view';
import { inBox } from './lot-rows';
import { type BoxRow, findBox, linesOf, storedAddress } from './rows';
import { amountText } from './rules';
import type { PlateView } from './schemas';
import { guideCode, shortHash } from './serial';

export type BoxPaper = 'guide' | 'slip' | 'label';

/** All that a paper of one box may need: the box, its order, and the frozen content it was made from. */
export interface BoxPapers {
  serial: string;
  plate: PlateView;
  hash: string;
  guideCode: string;
  versionState: VersionState;
  content: VersionContent;
  verdict: Verdict | null;
  signOff: { by: string; at: number } | null;
  orderNumber: string;
  buyer: string;
  address: string[];
  giftNote: string;
  position: number;
  of: number;
  packedBy: string;
  closedAt: number | null;
  expectedMilligrams: number;
  weighedMilligrams: number | null;
  guideScannedAt: number | null;
  lines: {
    reference: string;
    partCode: string;
    name: string;
    kind: string;
    needed: number;
    unit: 'each' | 'metre' | 'gram';
    amount: string;
    bins: string[];
    scannedAt: number | null;
  }[];
}

/**
 * Reads what a paper of a box is made from. It names the box, never a version, so that no paper can be of another
 * version than its box; the content's hash is recomputed. Whoever may not have the paper learns only that there is none.
 */
export async function readBoxPapers(
  actor: Actor,
  { boxId, paper, key }: { boxId: string; paper: BoxPaper; key?: string | undefined },
): Promise<BoxPapers> {
  const sql = reading();
  const box = await findBox(sql, boxId);
  const order = box && (await orderOf(sql, box));
  const holdsLink = key !== undefined && order !== undefined && sha256(key) === order.linkHash;
  if (!box || !order || !can(actor, `paper.${paper}`, { customerId: order.customerId, holdsLink })) {
    throw missing('There is no such paper for you. Open it from your order, or from the link in your e-mail.');
  }
  const frozen = await readFrozen(sql, box.versionId);
  if (frozen.state !== 'released' && frozen.state !== 'withdrawn') {
    throw refused(`Version ${box.kitNumber} ${box.letter} is not released, so nothing of it is printed.`);
  }
  const signOff = await readSignOff(sql, box.versionId);
  return {
    serial: box.serial,
    plate: plateOf(box),
    hash: shortHash(frozen.contentHash),
    guideCode: guideCode(frozen.contentHash, box.serial),
    versionState: frozen.state,
    content: frozen.content,
    verdict: signOff?.verdict ?? null,
    signOff: signOff && { by: signOff.by, at: signOff.at },
    orderNumber: box.orderNumber,
    buyer: box.buyer,
    address: storedAddress(order.address),
    giftNote: order.giftNote,
    position: box.position,
    of: Number(box.of),
    packedBy: box.closedName ?? box.claimedName ?? '',
    closedAt: box.closedAt,
    expectedMilligrams: box.expectedMilligrams,
    weighedMilligrams: box.weighedMilligrams,
    guideScannedAt: box.guideScannedAt,
    lines: await printedLines(sql, box),
  };
}

interface OrderOfBox {
  customerId: string | null;
  linkHash: string;
  address: string;
  giftNote: string;
}

const orderOf = (sql: Knex, box: BoxRow): Promise<OrderOfBox | undefined> =>
  sql('orders').where('id', box.orderId).first<OrderOfBox | undefined>({
    customerId: 'customer_id',
    linkHash: 'link_hash',
    address: 'address',
    giftNote: 'gift_note',
  });

async function printedLines(sql: Knex, box: BoxRow): Promise<BoxPapers['lines']> {
  const picked = await inBox(sql, box.id);
  const bins = await sql('bins')
    .whereIn('id', [...new Set(picked.map((pick) => pick.binId))])
    .select<{ id: string; code: string }[]>('id', 'code');
  const codes = new Map(bins.map((bin) => [bin.id, bin.code]));
  return (await linesOf(sql, [box.id])).map((line) => {
    const mine = picked.filter((pick) => pick.lineId === line.id);
    return {
      reference: line.reference,
      partCode: line.partCode,
      name: line.name,
      kind: line.kind,
      needed: line.needed,
      unit: line.unit,
      amount: amountText(line.needed, line.unit),
      bins: [...new Set(mine.map((pick) => codes.get(pick.binId) ?? ''))],
      scannedAt: mine.reduce<number | null>((last, pick) => Math.max(last ?? 0, pick.at), null),
    };
  });
}
