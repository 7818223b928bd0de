import type { Knex } from 'knex';
import { type Actor, personIdOf } from '../access';
import { frozenContent } from '../kits';
import type { FrozenLine, VersionContent } from '../kits/schemas';
import { silhouetteOf } from '../parts/schemas';
import type { Instant } from '../time';
import { type InBox, type LotOfPart, inBox, lotsOf } from './lot-rows';
import { type BoxLineRow, type BoxRow, getBox, linesOf } from './rows';
import { weighing } from './mass';
import { amountText, claimLapsed, closeBlockers, countPieces, isIn, suggest, barOf } from './rules';
import type { BoxCard, BoxView, TrayPlace } from './schemas';
import { guideCode, shortHash } from './serial';

/** The tray screen of one box. The content's hash is recomputed on the way: a box of changed content is not shown. */
export async function boxView(sql: Knex, actor: Actor, boxId: string, now: Instant): Promise<BoxView> {
  const box = await getBox(sql, boxId);
  const { content, contentHash } = await frozenContent(sql, box.versionId);
  const lines = await linesOf(sql, [box.id]);
  const lots = await lotsOf(sql, [...new Set(lines.map((line) => line.partId))]);
  const picked = await inBox(sql, box.id);
  const places = trayPlaces(lines, lots, content);
  const mass = weighing(box.expectedMilligrams, box.weighedMilligrams, content);

  return {
    id: box.id,
    serial: box.serial,
    plate: plateOf(box),
    versionState: box.versionState,
    hash: shortHash(contentHash),
    orderId: box.orderId,
    orderNumber: box.orderNumber,
    buyer: box.buyer,
    position: box.position,
    of: box.of,
    state: box.state,
    claim: claimOf(box, actor, now),
    places,
    pieces: countPieces(lines),
    nextLineId: places.find((place) => place.state === 'next')?.lineId ?? null,
    guide: {
      code: guideCode(contentHash, box.serial),
      printedAt: box.guidePrintedAt,
      scannedAt: box.guideScannedAt,
    },
    slipPrintedAt: box.slipPrintedAt,
    mass,
    reasons: blockersOf(box, lines, picked, mass),
    closedAt: box.closedAt,
  };
}

export function blockersOf(
  box: BoxRow,
  lines: readonly BoxLineRow[],
  picked: readonly InBox[],
  mass: BoxView['mass'],
): string[] {
  const blocked = picked.filter((pick) => pick.lotState !== 'accepted');
  return closeBlockers({
    state: box.state,
    bar: barOf(box),
    lines,
    blockedLots: blocked.map((pick) => ({ lotCode: pick.lotCode, name: pick.name })),
    slipPrintedAt: box.slipPrintedAt,
    guidePrintedAt: box.guidePrintedAt,
    guideScannedAt: box.guideScannedAt,
    mass,
  });
}

export const plateOf = (box: Pick<BoxRow, 'kitNumber' | 'letter' | 'kitName'>) => ({
  kitNumber: box.kitNumber,
  letter: box.letter,
  kitName: box.kitName,
});

export function claimOf(box: BoxRow, actor: Actor, now: Instant): BoxCard['claim'] {
  if (box.state !== 'packing' || box.claimedBy === null || box.claimedAt === null) return null;
  return {
    by: box.claimedName ?? '',
    mine: box.claimedBy === personIdOf(actor),
    since: box.claimedAt,
    lapsed: claimLapsed(box.claimedAt, now),
  };
}

/** The tray as it lies: places keep their order, the first that can be filled is next. */
export function trayPlaces(
  lines: readonly BoxLineRow[],
  lots: readonly LotOfPart[],
  content: Pick<VersionContent, 'lines'>,
): TrayPlace[] {
  const frozen = new Map(content.lines.map((line) => [line.reference, line]));
  let nextGiven = false;
  return lines.map((line) => {
    const mine = lots.filter((lot) => lot.partId === line.partId);
    const suggestion = isIn(line) ? null : suggest(mine, line);
    const state = stateOf(line, suggestion !== null, nextGiven);
    if (state === 'next') nextGiven = true;
    return {
      lineId: line.id,
      reference: line.reference,
      kind: line.kind,
      family: familyAt(frozen.get(line.reference)),
      partCode: line.partCode,
      name: line.name,
      unit: line.unit,
      needed: line.needed,
      packed: line.packed,
      amount: amountText(line.needed - line.packed || line.needed, line.unit),
      state,
      suggestion: suggestion && {
        lotId: suggestion.lotId,
        lotCode: suggestion.lotCode,
        binId: suggestion.binId,
        binCode: suggestion.binCode,
        binPosition: suggestion.binPosition,
        onHand: suggestion.onHand,
      },
      note: frozen.get(line.reference)?.note ?? '',
    };
  });
}

const familyAt = (line: FrozenLine | undefined) => (line?.part ? silhouetteOf(line.part.values) : 'packet');

/** A bin told empty without another lot to go to, or a part with none at all, waits for the store. */
function stateOf(line: BoxLineRow, hasLot: boolean, nextGiven: boolean): TrayPlace['state'] {
  if (isIn(line)) return 'in';
  if (!hasLot) return 'told';
  return nextGiven ? 'waiting' : 'next';
}
