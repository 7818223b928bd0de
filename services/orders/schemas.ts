import { z } from 'zod';
import { BoxId, OrderId, VersionId } from '../ids';
import { Money } from '../money';

/** The random id in the buyer's cookie; whoever holds it sees this basket. */
export const BasketId = z.string().regex(/^[0-9a-hjkmnp-tv-z]{26}$/, 'This is not a basket of ours.');

export const ChangeBasket = z.strictObject({
  basketId: BasketId,
  versionId: VersionId,
  /** 0 takes the kit out. */
  quantity: z.int('Whole kits.').min(0, 'Not fewer than none.').max(500, 'For more than 500 kits, write to the yard.'),
});
export type ChangeBasket = z.infer<typeof ChangeBasket>;

export const BasketLine = z.strictObject({
  versionId: VersionId,
  code: z.string(),
  number: z.int(),
  name: z.string(),
  letter: z.string(),
  quantity: z.int(),
  /** Tax included; null where the kit has no price, or its version is no longer sold. */
  unit: Money.nullable(),
  total: Money.nullable(),
  ready: z.int(),
  /** Why this line cannot be ordered as it stands. */
  trouble: z.string().nullable(),
  /** A larger number that costs less in all. */
  cheaper: z.strictObject({ quantity: z.int(), total: Money }).nullable(),
});
export type BasketLine = z.infer<typeof BasketLine>;

export const BasketView = z.strictObject({
  lines: z.array(BasketLine),
  count: z.int(),
  total: Money,
});
export type BasketView = z.infer<typeof BasketView>;

/** No control characters, and no longer than a label prints. */
const labelLine = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `The label prints ${most} characters a line. Shorten it.`)
    .regex(/^\P{Cc}*$/u, 'This holds a character that no label prints. Type it again.');

export const Address = z.strictObject({
  line1: labelLine(60).min(1, 'Give the street and number, or the name of the house.'),
  line2: labelLine(60).default(''),
  town: labelLine(60).min(1, 'Give the town.'),
  /** Free text: some countries have none, and no list of patterns is ever complete. */
  postcode: labelLine(16).default(''),
  country: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]{2}$/, 'Choose the country.'),
});
export type Address = z.infer<typeof Address>;

export const PlaceOrder = z.strictObject({
  basketId: BasketId,
  email: z
    .string()
    .trim()
    .normalize('NFKC')
    .max(254, 'This address is too long.')
    .regex(
      /^[^\s"(),:;<>@[\\\]]+@[^\s"(),:;<>@[\\\]]+\.[^\s"(),:;<>@[\\\]]+$/,
      'Give an e-mail address like name@example.org.',
    ),
  name: labelLine(60).min(2, 'Give the name for the label.'),
  address: Address,
  deliveryCode: z.string().min(1, 'Choose how it is to be sent.').max(40),
  giftNote: z.string().trim().max(300, 'A gift note has up to 300 characters.').default(''),
});
export type PlaceOrder = z.input<typeof PlaceOrder>;

/** An order and, for who has not signed in, the secret of its long link. */
export const OrderRef = z.strictObject({ orderId: OrderId, key: z.string().max(100).optional() });
export type OrderRef = z.infer<typeof OrderRef>;

export const DeliveryMethod = z.strictObject({
  code: z.string().regex(/^[a-z][a-z0-9-]{1,30}$/, 'A code is small letters, digits and hyphens.'),
  name: z.string().trim().min(2).max(60),
  promise: z.string().trim().min(2, 'Say when it arrives, "2 to 3 working days".').max(80),
  /** Two-letter codes; "*" serves every other country. */
  countries: z.array(z.string().regex(/^([A-Z]{2}|\*)$/, 'A country is two letters, or *.')).min(1),
  price: Money,
});
export type DeliveryMethod = z.infer<typeof DeliveryMethod>;

export const SetDelivery = z.strictObject({
  methods: z.array(DeliveryMethod).min(1, 'Keep at least one method.').max(20),
});
export type SetDelivery = z.infer<typeof SetDelivery>;

export const SetTax = z.strictObject({
  rates: z.array(
    z.strictObject({
      country: z.string().regex(/^[A-Z]{2}$/, 'A country is two letters.'),
      /** 20 % is 2000. */
      basisPoints: z.int().min(0).max(10_000),
    }),
  ),
});
export type SetTax = z.infer<typeof SetTax>;

export const PaymentState = z.enum(['awaiting-payment', 'paid', 'part-refunded', 'refunded', 'cancelled']);
export type PaymentState = z.infer<typeof PaymentState>;

export const FulfilmentState = z.enum([
  'placed',
  'allocated',
  'backordered',
  'picking',
  'packed',
  'shipped',
  'cancelled',
]);
export type FulfilmentState = z.infer<typeof FulfilmentState>;

export const OrderLine = z.strictObject({
  versionId: VersionId,
  code: z.string(),
  number: z.int(),
  name: z.string(),
  letter: z.string(),
  quantity: z.int(),
  unit: Money,
  total: Money,
  /** What the frozen version says of the set: what it tunes, how much wire it wants, whether it wants an earth. */
  set: z
    .strictObject({
      tunes: z.strictObject({ lo: z.number(), hi: z.number() }),
      aerialMetres: z.int(),
      earth: z.boolean(),
    })
    .nullable(),
});
export type OrderLine = z.infer<typeof OrderLine>;

export const Stage = z.strictObject({
  name: z.enum(['Paid', 'Picked', 'Packed', 'Sent', 'Delivered']),
  state: z.enum(['done', 'now', 'waiting']),
  at: z.int().nullable(),
  note: z.string(),
});
export type Stage = z.infer<typeof Stage>;

export const OrderBox = z.strictObject({
  id: BoxId,
  serial: z.string(),
  versionId: VersionId,
  state: z.enum(['to-pack', 'packing', 'closed', 'shipped']),
  contents: z.array(
    z.strictObject({
      reference: z.string(),
      name: z.string(),
      kind: z.string(),
      quantity: z.int(),
      unit: z.enum(['each', 'metre', 'gram']),
    }),
  ),
});
export type OrderBox = z.infer<typeof OrderBox>;

export const OrderView = z.strictObject({
  id: OrderId,
  number: z.string(),
  email: z.string(),
  name: z.string(),
  address: Address,
  giftNote: z.string(),
  delivery: z.strictObject({ code: z.string(), name: z.string(), promise: z.string() }),
  payment: PaymentState,
  fulfilment: FulfilmentState,
  placedAt: z.int(),
  paidAt: z.int().nullable(),
  shippedAt: z.int().nullable(),
  lines: z.array(OrderLine),
  linesTotal: Money,
  deliveryPrice: Money,
  tax: Money,
  taxBasisPoints: z.int(),
  total: Money,
  paid: Money,
  refunded: Money,
  headline: z.string(),
  lead: z.string(),
  timeline: z.array(Stage),
  boxes: z.array(OrderBox),
  invoice: z.strictObject({ id: z.string(), number: z.int() }).nullable(),
  shipments: z.array(z.strictObject({ carrier: z.string(), trackingNumber: z.string(), at: z.int() })),
  /** Until when the kits of an unpaid order are set aside; null where they are not. */
  keptUntil: z.int().nullable(),
  /** The bank refused the last try and nothing was taken. */
  bankSaidNo: z.boolean(),
  may: z.strictObject({ pay: z.boolean(), cancel: z.boolean(), claim: z.boolean() }),
  /** Why somebody of the yard has to look at it; staff see it, buyers do not. */
  lookAtIt: z.string().nullable(),
});
export type OrderView = z.infer<typeof OrderView>;

/** One row of a list of orders. */
export const OrderRow = z.strictObject({
  id: OrderId,
  number: z.string(),
  name: z.string(),
  placedAt: z.int(),
  payment: PaymentState,
  fulfilment: FulfilmentState,
  kits: z.string(),
  quantity: z.int(),
  total: Money,
  lookAtIt: z.string().nullable(),
});
export type OrderRow = z.infer<typeof OrderRow>;

export const OrderPage = z.strictObject({ orders: z.array(OrderRow), older: z.string().nullable() });
export type OrderPage = z.infer<typeof OrderPage>;

export const OrderFilter = z.enum(['all', 'to-send', 'unpaid', 'look-at', 'sent', 'cancelled']);
export type OrderFilter = z.infer<typeof OrderFilter>;

export const ListOrders = z.strictObject({
  show: OrderFilter.default('all'),
  after: z
    .string()
    .regex(/^\d{1,16}-[0-9a-z]{26}$/, 'This page of the list is not known. Begin at the newest.')
    .optional(),
});
export type ListOrders = z.input<typeof ListOrders>;

/** An issued invoice: everything it says, frozen. */
export const Invoice = z.strictObject({
  number: z.int(),
  issuedAt: z.int(),
  order: z.strictObject({ number: z.string(), placedAt: z.int(), paidAt: z.int() }),
  seller: z.strictObject({ name: z.string(), lines: z.array(z.string()), country: z.string(), taxId: z.string() }),
  buyer: z.strictObject({ name: z.string(), email: z.string(), address: Address }),
  lines: z.array(
    z.strictObject({ name: z.string(), letter: z.string(), quantity: z.int(), unit: Money, total: Money }),
  ),
  delivery: z.strictObject({ name: z.string(), price: Money }),
  taxBasisPoints: z.int(),
  net: Money,
  tax: Money,
  total: Money,
});
export type Invoice = z.infer<typeof Invoice>;

/** What the checkout form shows. */
export interface CheckoutView {
  basket: BasketView;
  /** Ways of sending with the countries they serve; "*" for everywhere else. */
  deliveries: { code: string; name: string; promise: string; countries: string[]; price: string; minor: number }[];
  /** What is known of a buyer who has signed in. */
  known: { email: string; name: string } | null;
}
