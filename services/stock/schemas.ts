import { z } from 'zod';
import { BinId, LotId, PartId } from '../ids';

export const LotCode = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z0-9][A-Z0-9-]{2,23}$/, 'A lot code is 3 to 24 letters, digits and hyphens, like L-2611-04.');

export const BinCode = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z]{1,2}-[0-9]{1,3}$/, 'A bin is an aisle and a place, like C-14.');

/** A delivery of one part, put into one bin. */
export const ReceiveLot = z.strictObject({
  partId: PartId,
  lotCode: LotCode,
  supplier: z.string().trim().min(2, 'Say who sent it.').max(80, 'Keep the supplier under 80 characters.'),
  binCode: BinCode,
  /** Pieces; millimetres for a part measured in metres; milligrams for one measured in grams. */
  quantity: z
    .int('Whole pieces, millimetres or milligrams.')
    .min(1, 'Say how much came: more than none.')
    .max(1_000_000_000, 'That is more than the store holds. Check the unit.'),
  /** Of one piece, one metre or one gram. */
  unitCostMinor: z.int('The cost is in whole pence.').min(0, 'A cost is not below zero.').max(100_000_000),
  /** Inspected and right; without it the lot waits in quarantine. */
  accepted: z.boolean(),
});
export type ReceiveLot = z.infer<typeof ReceiveLot>;

export const AcceptLot = z.strictObject({
  lotId: LotId,
  reason: z.string().trim().min(3, 'Say in a few words what was looked at.').max(300),
});
export type AcceptLot = z.infer<typeof AcceptLot>;

export const BlockLot = z.strictObject({
  lotId: LotId,
  reason: z.string().trim().min(3, 'Say in a few words why nobody may use it.').max(300),
});
export type BlockLot = z.infer<typeof BlockLot>;

export const LotState = z.enum(['quarantine', 'accepted', 'blocked']);
export type LotState = z.infer<typeof LotState>;

export const StoredLot = z.strictObject({
  id: LotId,
  code: z.string(),
  supplier: z.string(),
  state: LotState,
  receivedAt: z.int(),
  onHand: z.int(),
  bins: z.array(z.strictObject({ id: BinId, code: z.string(), onHand: z.int() })),
});
export type StoredLot = z.infer<typeof StoredLot>;

/** One part as the store sees it. Quantities in base units: pieces, millimetres, milligrams. */
export const StoredPart = z.strictObject({
  id: PartId,
  code: z.string(),
  name: z.string(),
  /** Which drawing stands for it. */
  silhouette: z.string(),
  unit: z.enum(['each', 'metre', 'gram']),
  onHand: z.int(),
  accepted: z.int(),
  reserved: z.int(),
  allocated: z.int(),
  available: z.int(),
  lots: z.array(StoredLot),
});
export type StoredPart = z.infer<typeof StoredPart>;

export const StoreView = z.strictObject({ parts: z.array(StoredPart) });
export type StoreView = z.infer<typeof StoreView>;

/** What the form for a delivery needs of each part. */
export const Receivable = StoredPart.pick({ id: true, code: true, name: true, unit: true }).extend({
  /** Where other lots of it lie. */
  bins: z.array(z.string()),
});
export type Receivable = z.infer<typeof Receivable>;
