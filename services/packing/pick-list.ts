import { type Actor, can, must } from '../access';
import { reading, now } from '../record';
import { PartValues, silhouetteOf } from '../parts/schemas';
import { prepareBoxes } from './make-boxes';
import { type LotOfPart, lotsOf } from './lot-rows';
import { type BoxLineRow, type BoxRow, linesOf } from './rows';
import { amountText, isIn } from './rules';
import type { PickList, PickStop } from './schemas';
import { cardsOf, openBoxes } from './views';

/** Boxes fetched in one walk when nobody says otherwise; ten trays fit a trolley. */
const boxesInAWalk = 10;

/** One walk along the bins for the oldest boxes: at each bin what to take, of which lot, and for which boxes. */
export async function readPickList(actor: Actor, input: { boxes?: number } = {}): Promise<PickList> {
  must(actor, 'box.list');
  if (can(actor, 'box.prepare')) await prepareBoxes(actor);
  const sql = reading();
  const all = (await openBoxes(sql)).filter((box) => box.versionState === 'released');
  const asked = Math.max(1, Math.min(50, input.boxes ?? boxesInAWalk));
  const walk = all.slice(0, asked);
  const lines = (
    await linesOf(
      sql,
      walk.map((box) => box.id),
    )
  ).filter((line) => !isIn(line));
  const lots = await lotsOf(sql, [...new Set(lines.map((line) => line.partId))]);
  const { takes, short } = shareLots(walk, lines, lots);
  return {
    asked,
    boxes: await cardsOf(sql, actor, walk, now()),
    stops: stopsOf(takes),
    short,
    more: all.length - walk.length,
  };
}

interface Take {
  box: BoxRow;
  line: BoxLineRow;
  lot: LotOfPart;
  quantity: number;
}

/** Gives each box in turn the oldest lots that are left; a cut length comes from one reel only. */
function shareLots(
  walk: readonly BoxRow[],
  lines: readonly BoxLineRow[],
  lots: readonly LotOfPart[],
): { takes: Take[]; short: PickList['short'] } {
  const left = new Map(lots.map((lot) => [lot, lot.onHand]));
  const takes: Take[] = [];
  const missing = new Map<string, { line: BoxLineRow; quantity: number }>();
  for (const box of walk) {
    for (const line of lines.filter((one) => one.boxId === box.id)) {
      let wanted = line.needed - line.packed;
      for (const lot of lots.filter((one) => one.partId === line.partId)) {
        const here = left.get(lot) ?? 0;
        const quantity = line.unit === 'each' ? Math.min(wanted, here) : here >= wanted ? wanted : 0;
        if (quantity === 0) continue;
        takes.push({ box, line, lot, quantity });
        left.set(lot, here - quantity);
        wanted -= quantity;
      }
      if (wanted > 0) {
        const before = missing.get(line.partId)?.quantity ?? 0;
        missing.set(line.partId, { line, quantity: before + wanted });
      }
    }
  }
  const short = [...missing.values()].map(({ line, quantity }) => ({
    partCode: line.partCode,
    name: line.name,
    amount: amountText(quantity, line.unit),
  }));
  return { takes, short };
}

/** Bins in walking order, and in each bin one entry a lot. */
function stopsOf(takes: readonly Take[]): PickStop[] {
  const inOrder = [...takes].sort(
    (a, b) => a.lot.binPosition - b.lot.binPosition || (a.lot.binCode < b.lot.binCode ? -1 : 1),
  );
  const stops = new Map<string, Map<string, Take[]>>();
  for (const take of inOrder) {
    const bin = stops.get(take.lot.binCode) ?? new Map<string, Take[]>();
    bin.set(take.lot.lotCode, [...(bin.get(take.lot.lotCode) ?? []), take]);
    stops.set(take.lot.binCode, bin);
  }
  return [...stops].map(([binCode, byLot]) => ({
    binCode,
    items: [...byLot].flatMap(([lotCode, these]) => {
      const [first] = these;
      if (!first) return [];
      const { line } = first;
      const total = these.reduce((sum, take) => sum + take.quantity, 0);
      return {
        partCode: line.partCode,
        name: line.name,
        family: silhouetteOf(PartValues.parse(JSON.parse(line.values))),
        lotCode,
        // Cut lengths are cut one by one: "3 of 14 m" tells more than 42 m.
        amount: line.unit === 'each' ? String(total) : cuts(these),
        boxes: these.map((take) => ({
          serial: take.box.serial,
          orderNumber: take.box.orderNumber,
          position: take.box.position,
          amount: amountText(take.quantity, line.unit),
        })),
      };
    }),
  }));
}

function cuts(takes: readonly Take[]): string {
  const lengths = new Map<string, number>();
  for (const { quantity, line } of takes) {
    const length = amountText(quantity, line.unit);
    lengths.set(length, (lengths.get(length) ?? 0) + 1);
  }
  return [...lengths].map(([length, count]) => (count === 1 ? length : `${count} of ${length}`)).join(', ');
}
