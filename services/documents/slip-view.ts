import type { BoxPapers } from '../packing';
import { countPieces } from '../packing/rules';
import { silhouetteOf } from '../parts/schemas';
import type { Contour, Verdict } from '../receiver';
import { type Instant, showClock, showDate } from '../time';
import { reachOf } from './guide-view';
import { printable } from './rules';
import type { LabelView, SlipView } from './schemas';
import { contactOf, sellerLine } from './seller-line';

/** The packing slip of one box: what is in it, in the order of the guide's checklist, and no price. */
export function slipView(papers: BoxPapers, verdict: Verdict, chance: Contour | null): SlipView {
  const { content, serial } = papers;
  const order = new Map(content.lines.map((line, index) => [line.reference, index]));
  const lines = papers.lines
    .filter((line) => line.kind !== 'packaging')
    .sort((a, b) => (order.get(a.reference) ?? 0) - (order.get(b.reference) ?? 0));
  const counted = countPieces(lines.map(({ unit, needed }) => ({ unit, needed, packed: 0 }))).needed;
  return {
    seller: sellerLine(),
    plate: plateOn(papers),
    serial,
    hash: papers.hash,
    orderNumber: papers.orderNumber,
    position: papers.position,
    of: papers.of,
    sendTo: [papers.buyer, ...papers.address].map(printable),
    packed: packedLine(papers),
    weight: {
      weighed: papers.weighedMilligrams === null ? null : kilograms(papers.weighedMilligrams),
      expected: kilograms(papers.expectedMilligrams),
    },
    lines: [
      ...lines.map((line) => ({
        reference: line.reference,
        family: familyIn(papers, line.reference),
        name: printable(line.unit === 'each' ? line.name : `${line.name}, ${line.amount}`),
        bin: line.bins.join(', '),
        pieces: line.unit === 'each' ? line.needed : 1,
        amount: line.amount,
        scanned: clock(line.scannedAt),
      })),
      {
        reference: 'G',
        family: 'guide',
        name: `Printed guide for ${papers.plate.kitNumber} ${papers.plate.letter}`,
        bin: 'print',
        pieces: 1,
        amount: '1',
        scanned: clock(papers.guideScannedAt),
      },
    ],
    pieces: counted + 1,
    giftNote: printable(papers.giftNote),
    reach: reachOf(content, verdict, chance),
    signOff: papers.signOff && { by: papers.signOff.by, on: showDate(papers.signOff.at) },
    missing: `Count the pieces against the last column before you start. Is one missing? Write to ${contactOf()} with ${serial} and the line, and it goes out the same day.`,
  };
}

function familyIn({ content }: BoxPapers, reference: string): string {
  const part = content.lines.find((line) => line.reference === reference)?.part;
  return part ? silhouetteOf(part.values) : 'packet';
}

/** Who packed and when: the last scan while the lid is still open, the lid once it is on. */
function packedLine(papers: BoxPapers): SlipView['packed'] {
  const last = papers.lines.reduce((latest, line) => Math.max(latest, line.scannedAt ?? 0), 0);
  const at = papers.closedAt ?? (last > 0 ? last : null);
  return at === null ? null : { on: `${showDate(at)}, ${showClock(at)}`, by: papers.packedBy };
}

const clock = (at: Instant | null) => (at === null ? '' : showClock(at));
const kilograms = (milligrams: number) => (milligrams / 1_000_000).toFixed(2);

const plateOn = ({ plate }: BoxPapers) => ({
  number: plate.kitNumber,
  letter: plate.letter,
  name: printable(plate.kitName),
});

export function labelView(papers: BoxPapers): LabelView {
  return {
    seller: sellerLine(),
    plate: plateOn(papers),
    serial: papers.serial,
    hash: papers.hash,
    orderNumber: papers.orderNumber,
    position: papers.position,
    of: papers.of,
    mass: `${kilograms(papers.weighedMilligrams ?? papers.expectedMilligrams)} kg`,
    ageFrom: papers.content.kit.ageFrom,
  };
}
