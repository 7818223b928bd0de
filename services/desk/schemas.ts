import { z } from 'zod';
import { PricedKit } from '../catalogue/schemas';
import { OrderId, VersionId } from '../ids';
import { Money } from '../money';

export const DayTakings = z.strictObject({
  /** "Mon 23" */
  label: z.string(),
  takings: Money,
  /** The same weekday a week before. */
  before: Money,
});
export type DayTakings = z.infer<typeof DayTakings>;

/** What waits for the owner: a fact, a figure, and where to go with it. */
export const Waiting = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('order'), orderId: OrderId, number: z.string(), why: z.string() }),
  z.strictObject({
    kind: z.literal('held'),
    versionId: VersionId,
    name: z.string(),
    kitNumber: z.int(),
    letter: z.string(),
    why: z.string(),
  }),
  z.strictObject({ kind: z.literal('price'), code: z.string(), name: z.string() }),
  z.strictObject({ kind: z.literal('short'), code: z.string(), name: z.string(), part: z.string() }),
]);
export type Waiting = z.infer<typeof Waiting>;

export const LateOrder = z.strictObject({
  orderId: OrderId,
  number: z.string(),
  name: z.string(),
  paidAt: z.int(),
  fulfilment: z.string(),
});
export type LateOrder = z.infer<typeof LateOrder>;

export const Today = z.strictObject({
  at: z.int(),
  figures: z.strictObject({
    today: Money,
    week: Money,
    boxesSent: z.int(),
    /** Hours from paid to sent, the middle one of the week; null where nothing was sent. */
    hoursToSend: z.number().nullable(),
    refunded: Money,
    refundedOrders: z.int(),
  }),
  toSend: z.strictObject({ orders: z.int(), boxes: z.int(), unpaid: z.int() }),
  days: z.array(DayTakings),
  waiting: z.array(Waiting),
  late: z.array(LateOrder),
  onSale: z.array(PricedKit.extend({ sold: z.int() })),
});
export type Today = z.infer<typeof Today>;
