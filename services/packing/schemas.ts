import { z } from 'zod';
import { BinId, BoxId, LineId, LotId, OrderId } from '../ids';
import { VersionState } from '../kits/schemas';

export const BoxState = z.enum(['to-pack', 'packing', 'closed', 'shipped']);
export type BoxState = z.infer<typeof BoxState>;

export const ClaimBox = z.strictObject({ boxId: BoxId });
export type ClaimBox = z.input<typeof ClaimBox>;

export const Scan = z.strictObject({
  boxId: BoxId,
  code: z.string().trim().toUpperCase().min(1, 'Scan or type a code.').max(60, 'A code has at most 60 characters.'),
  /** Pieces counted into the box with one scan; a cut length of wire is one piece whatever its length. */
  pieces: z.int('Whole pieces.').min(1, 'At least one piece.').max(1000, 'At most 1000 pieces at once.').default(1),
});
export type Scan = z.input<typeof Scan>;

export const PutBack = z.strictObject({ boxId: BoxId, lineId: LineId });
export type PutBack = z.input<typeof PutBack>;

export const TellEmpty = z.strictObject({ boxId: BoxId, lineId: LineId });
export type TellEmpty = z.input<typeof TellEmpty>;

export const MarkPrinted = z.strictObject({ boxId: BoxId, paper: z.enum(['slip', 'guide']) });
export type MarkPrinted = z.input<typeof MarkPrinted>;

export const Weigh = z.strictObject({
  boxId: BoxId,
  milligrams: z
    .int('Type what the scale shows, in grams.')
    .min(1, 'A box weighs more than nothing.')
    .max(100_000_000, 'A box weighs at most 100 kg. Is the figure in grams?'),
});
export type Weigh = z.input<typeof Weigh>;

export const CloseBox = z.strictObject({ boxId: BoxId });
export type CloseBox = z.input<typeof CloseBox>;

export const Ship = z.strictObject({
  orderId: OrderId,
  carrier: z.string().trim().min(2, 'Name the carrier.').max(60, 'Keep the carrier under 60 characters.'),
  trackingNumber: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z0-9][A-Z0-9 -]{3,39}$/, 'A tracking number has 4 to 40 letters and digits. Copy it from the label.'),
});
export type Ship = z.input<typeof Ship>;

export const PlateView = z.strictObject({ kitNumber: z.int(), letter: z.string(), kitName: z.string() });
export type PlateView = z.infer<typeof PlateView>;

/** One box in the list of what to pack. */
export const BoxCard = z.strictObject({
  id: BoxId,
  serial: z.string(),
  plate: PlateView,
  orderNumber: z.string(),
  buyer: z.string(),
  position: z.int(),
  of: z.int(),
  state: BoxState,
  pieces: z.strictObject({ packed: z.int(), needed: z.int() }),
  paidAt: z.int(),
  dueAt: z.int(),
  late: z.boolean(),
  /** Who has it just now; null where anybody may take it. */
  claim: z.strictObject({ by: z.string(), mine: z.boolean(), since: z.int(), lapsed: z.boolean() }).nullable(),
  /** Why nobody may pack it, "version 4 F was withdrawn" say; empty as a rule. */
  barred: z.string(),
});
export type BoxCard = z.infer<typeof BoxCard>;

/** A piece of a lot lying in a bin. */
export const LotPlace = z.strictObject({
  lotId: LotId,
  lotCode: z.string(),
  binId: BinId,
  binCode: z.string(),
  binPosition: z.int(),
  onHand: z.int(),
});
export type LotPlace = z.infer<typeof LotPlace>;

/** One place of the tray. */
export const TrayPlace = z.strictObject({
  lineId: LineId,
  reference: z.string(),
  kind: z.string(),
  /** Which silhouette stands for it. */
  family: z.string(),
  partCode: z.string(),
  name: z.string(),
  unit: z.enum(['each', 'metre', 'gram']),
  /** Pieces; millimetres or milligrams for wire and wax. */
  needed: z.int(),
  packed: z.int(),
  /** "14 m" or "2": what to fetch, as people say it. */
  amount: z.string(),
  state: z.enum(['waiting', 'next', 'in', 'told']),
  suggestion: LotPlace.nullable(),
  note: z.string(),
});
export type TrayPlace = z.infer<typeof TrayPlace>;

export const MassView = z.strictObject({
  expected: z.int(),
  low: z.int(),
  high: z.int(),
  weighed: z.int().nullable(),
  sentence: z.string(),
  fits: z.boolean(),
});
export type MassView = z.infer<typeof MassView>;

/** The tray screen. */
export const BoxView = z.strictObject({
  id: BoxId,
  serial: z.string(),
  plate: PlateView,
  versionState: VersionState,
  /** First eight characters of the content's hash, as the papers print them. */
  hash: z.string(),
  orderId: OrderId,
  orderNumber: z.string(),
  buyer: z.string(),
  position: z.int(),
  of: z.int(),
  state: BoxState,
  claim: BoxCard.shape.claim,
  places: z.array(TrayPlace),
  pieces: z.strictObject({ packed: z.int(), needed: z.int() }),
  nextLineId: LineId.nullable(),
  guide: z.strictObject({ code: z.string(), printedAt: z.int().nullable(), scannedAt: z.int().nullable() }),
  slipPrintedAt: z.int().nullable(),
  mass: MassView,
  /** Everything that stands between this box and its lid, a sentence each. */
  reasons: z.array(z.string()),
  closedAt: z.int().nullable(),
});
export type BoxView = z.infer<typeof BoxView>;

/** What a scan came to: right or wrong, the sentence for it, and the box as it is now. */
export const ScanAnswer = z.strictObject({
  right: z.boolean(),
  title: z.string(),
  sentence: z.string(),
  lineId: LineId.nullable(),
  /** Pieces of the same lot still to come after a right scan, so that a handful can be counted in at once. */
  rest: z.strictObject({ code: z.string(), pieces: z.int() }).nullable(),
  at: z.int(),
  box: BoxView,
});
export type ScanAnswer = z.infer<typeof ScanAnswer>;

export const PickStop = z.strictObject({
  binCode: z.string(),
  items: z.array(
    z.strictObject({
      partCode: z.string(),
      name: z.string(),
      family: z.string(),
      lotCode: z.string(),
      amount: z.string(),
      /** "2 for Y-4127 box 1" */
      boxes: z.array(
        z.strictObject({ serial: z.string(), orderNumber: z.string(), position: z.int(), amount: z.string() }),
      ),
    }),
  ),
});
export type PickStop = z.infer<typeof PickStop>;

export const PickList = z.strictObject({
  /** Boxes in a walk, as it was asked for. */
  asked: z.int(),
  boxes: z.array(BoxCard),
  stops: z.array(PickStop),
  /** Parts for which no accepted lot lies in any bin. */
  short: z.array(z.strictObject({ partCode: z.string(), name: z.string(), amount: z.string() })),
  more: z.int(),
});
export type PickList = z.infer<typeof PickList>;

export const DispatchView = z.strictObject({
  waiting: z.array(
    z.strictObject({
      orderId: OrderId,
      orderNumber: z.string(),
      buyer: z.string(),
      address: z.array(z.string()),
      delivery: z.string(),
      boxes: z.array(z.strictObject({ id: BoxId, serial: z.string(), plate: PlateView, massMilligrams: z.int() })),
    }),
  ),
  sent: z.array(
    z.strictObject({
      orderId: OrderId,
      orderNumber: z.string(),
      buyer: z.string(),
      carrier: z.string(),
      trackingNumber: z.string(),
      at: z.int(),
      by: z.string(),
      serials: z.array(z.string()),
    }),
  ),
});
export type DispatchView = z.infer<typeof DispatchView>;

/** From a box to everything that went into it. */
export const TraceView = z.strictObject({
  serial: z.string(),
  boxId: BoxId,
  state: BoxState,
  plate: PlateView,
  versionId: z.string(),
  versionState: VersionState,
  contentHash: z.string(),
  /** The frozen content still has the hash it was released under. */
  contentHolds: z.boolean(),
  signOff: z
    .strictObject({
      by: z.string(),
      at: z.int(),
      engineVersion: z.string(),
      rulesVersion: z.string(),
      covers: z.boolean(),
    })
    .nullable(),
  orderNumber: z.string(),
  /** Only for those who may know the buyer. */
  buyer: z.strictObject({ name: z.string(), email: z.string(), address: z.array(z.string()) }).nullable(),
  packedBy: z.string().nullable(),
  closedAt: z.int().nullable(),
  massMilligrams: z.int().nullable(),
  shipment: z.strictObject({ carrier: z.string(), trackingNumber: z.string(), at: z.int() }).nullable(),
  lines: z.array(
    z.strictObject({
      reference: z.string(),
      partCode: z.string(),
      name: z.string(),
      kind: z.string(),
      needed: z.string(),
      lots: z.array(
        z.strictObject({
          lotId: LotId,
          lotCode: z.string(),
          supplier: z.string(),
          receivedAt: z.int(),
          blocked: z.boolean(),
          binCode: z.string(),
          amount: z.string(),
          by: z.string(),
          at: z.int(),
        }),
      ),
    }),
  ),
});
export type TraceView = z.infer<typeof TraceView>;

/** From a lot to all its boxes. */
export const LotTrace = z.strictObject({
  lotCode: z.string(),
  partCode: z.string(),
  name: z.string(),
  supplier: z.string(),
  receivedAt: z.int(),
  state: z.enum(['quarantine', 'accepted', 'blocked']),
  boxes: z.array(
    z.strictObject({
      serial: z.string(),
      plate: PlateView,
      state: BoxState,
      orderNumber: z.string(),
      buyer: z.string().nullable(),
      amount: z.string(),
    }),
  ),
});
export type LotTrace = z.infer<typeof LotTrace>;
