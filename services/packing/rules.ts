import type { VersionState } from '../kits/schemas';
import type { Address } from '../orders/schemas';
import type { PartUnit } from '../parts/schemas';
import { type Instant, days, minutes, showClock } from '../time';
import type { BoxState, LotPlace, MassView } from './schemas';

export { isSerial } from './serial';

/** A claim holds this long after the packer's last scan; then somebody else may take the box over. */
export const claimHolds = minutes(15);

export const claimLapsed = (claimedAt: Instant, now: Instant) => now - claimedAt >= claimHolds;

/** Paid orders leave within two days (our promise to buyers). */
export const dispatchDue = (paidAt: Instant): Instant => paidAt + days(2);

/** An order's fulfilment as packing may move it (kit-trade d.1). */
export type Fulfilment = 'placed' | 'allocated' | 'backordered' | 'picking' | 'packed' | 'shipped' | 'cancelled';

const packingMoves: Partial<Record<Fulfilment, readonly Fulfilment[]>> = {
  allocated: ['picking'],
  picking: ['packed'],
  packed: ['picking', 'shipped'],
};

export const mayMove = (from: Fulfilment, to: Fulfilment) => packingMoves[from]?.includes(to) ?? false;

interface Barred {
  versionState: VersionState;
  kitNumber: number;
  letter: string;
  payment: string;
  orderNumber: string;
}

/** Why a box may be neither packed nor sent, its version or its order being what they are; empty when it may. */
export function barOf(box: Barred): string {
  const name = versionName(box);
  if (box.versionState === 'withdrawn') {
    return `Version ${name} was withdrawn, so nobody packs or sends it. Ask the owner what the buyer gets.`;
  }
  if (box.versionState !== 'released')
    return `Version ${name} is not released, so nobody packs or sends it. Tell the owner.`;
  if (box.payment !== 'paid' && box.payment !== 'part-refunded') {
    return `Order ${box.orderNumber} is not paid any more, so nobody packs or sends it. Ask the owner.`;
  }
  return '';
}

export const versionName = (plate: { kitNumber: number; letter: string }) => `${plate.kitNumber} ${plate.letter}`;

/** "14 m", "350 mm", "2.5 g" or "4": an amount of stock as people say it. */
export function amountText(quantity: number, unit: PartUnit): string {
  if (unit === 'each') return String(quantity);
  if (unit === 'gram') return `${trimmed(quantity / 1000, 2)} g`;
  return quantity < 1000 ? `${quantity} mm` : `${trimmed(quantity / 1000, 2)} m`;
}

const trimmed = (value: number, decimals: number) => String(Number(value.toFixed(decimals)));

interface Counted {
  unit: PartUnit;
  needed: number;
  packed: number;
}

/** Wire and wax are cut to length: one piece, in the box or not. */
export const piecesNeeded = (line: Counted) => (line.unit === 'each' ? line.needed : 1);
export const piecesPacked = (line: Counted) =>
  line.unit === 'each' ? line.packed : line.packed >= line.needed ? 1 : 0;
export const isIn = (line: Counted) => line.packed >= line.needed;

export function countPieces(lines: readonly Counted[]): { packed: number; needed: number } {
  let [packed, needed] = [0, 0];
  for (const line of lines) {
    packed += piecesPacked(line);
    needed += piecesNeeded(line);
  }
  return { packed, needed };
}

export const pieces = (count: number) => (count === 1 ? '1 piece' : `${count} pieces`);

/**
 * Where to fetch the next piece: the oldest accepted lot that has enough for it, passing by the bin that was found
 * empty. A cut length must come from one reel; single pieces may come from several lots.
 */
export function suggest<Lot extends LotPlace>(
  lots: readonly Lot[],
  line: Counted & { toldEmptyBinId: string | null },
): Lot | null {
  const least = line.unit === 'each' ? 1 : line.needed - line.packed;
  return lots.find((lot) => lot.onHand >= Math.max(1, least) && lot.binId !== line.toldEmptyBinId) ?? null;
}

export const grams = (milligrams: number) => (milligrams / 1000).toFixed(1);

/** "Germanium detector" inside a sentence; a name that begins with an abbreviation keeps its capitals. */
export const lowerFirst = (name: string) =>
  /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;

export interface Closing {
  state: BoxState;
  bar: string;
  lines: readonly (Counted & { name: string; reference: string })[];
  blockedLots: readonly { lotCode: string; name: string }[];
  slipPrintedAt: Instant | null;
  guidePrintedAt: Instant | null;
  guideScannedAt: Instant | null;
  mass: Pick<MassView, 'weighed' | 'fits' | 'sentence'>;
}

/** Everything that stands between a box and its lid, a sentence each; none: it may close. */
export function closeBlockers(box: Closing): string[] {
  if (box.state === 'closed' || box.state === 'shipped') return ['This box is closed already.'];
  const reasons: string[] = [];
  if (box.bar !== '') reasons.push(box.bar);
  const { packed, needed } = countPieces(box.lines);
  if (packed < needed) {
    const missing = box.lines.filter((line) => !isIn(line)).map((line) => line.reference);
    reasons.push(`${pieces(needed - packed)} to go: ${missing.join(', ')}.`);
  }
  for (const lot of box.blockedLots) {
    reasons.push(
      `Lot ${lot.lotCode} (${lowerFirst(lot.name)}) was blocked meanwhile. Put its pieces back and take another lot.`,
    );
  }
  if (box.guidePrintedAt === null) reasons.push('The guide is not printed.');
  else if (box.guideScannedAt === null) reasons.push('The guide is not scanned. Scan the code on its cover.');
  if (box.slipPrintedAt === null) reasons.push('The packing slip is not printed.');
  if (!box.mass.fits) reasons.push(box.mass.weighed === null ? 'The box is not weighed.' : box.mass.sentence);
  return reasons;
}

const regions = new Intl.DisplayNames('en-GB', { type: 'region' });

/** The lines of an address label, top to bottom, without empty ones; the country stands alone on the last. */
export function addressLines({ line1, line2, town, postcode, country }: Address): string[] {
  const place = [town, postcode].filter((part) => part !== '').join(', ');
  return [line1, line2, place, regions.of(country) ?? country].filter((line) => line !== '');
}

/** Says who has a box that somebody else wants. */
export const takenSentence = (serial: string, by: string, since: Instant) =>
  `${by} has box ${serial} since ${showClock(since)}. Take the next one.`;
