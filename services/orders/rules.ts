import type { FulfilmentState, PaymentState, Stage } from './schemas';

/** Which state of payment may follow which (kit-trade d.1); what is not listed is refused. */
const paymentMoves: Record<PaymentState, readonly PaymentState[]> = {
  'awaiting-payment': ['paid', 'cancelled'],
  paid: ['part-refunded', 'refunded'],
  'part-refunded': ['refunded'],
  refunded: [],
  cancelled: [],
};
const fulfilmentMoves: Record<FulfilmentState, readonly FulfilmentState[]> = {
  placed: ['allocated', 'backordered', 'cancelled'],
  backordered: ['allocated', 'cancelled'],
  allocated: ['picking', 'backordered', 'cancelled'],
  picking: ['packed', 'allocated'],
  packed: ['shipped', 'picking'],
  shipped: [],
  cancelled: [],
};

export const paymentMayBecome = (from: PaymentState, to: PaymentState) => paymentMoves[from].includes(to);
export const fulfilmentMayBecome = (from: FulfilmentState, to: FulfilmentState) => fulfilmentMoves[from].includes(to);

/** A paid order can be cancelled until somebody begins to pack it. */
export const mayCancel = (order: { payment: PaymentState; fulfilment: FulfilmentState }) =>
  ['awaiting-payment', 'paid', 'part-refunded'].includes(order.payment) &&
  fulfilmentMayBecome(order.fulfilment, 'cancelled');

export const mayPay = (order: { payment: PaymentState }) => order.payment === 'awaiting-payment';

/** What the ledger of an order's money makes of its state of payment. */
export function paymentAfter(paidMinor: number, refundedMinor: number): PaymentState {
  if (paidMinor === 0) return 'awaiting-payment';
  if (refundedMinor === 0) return 'paid';
  return refundedMinor < paidMinor ? 'part-refunded' : 'refunded';
}

export interface Facts {
  payment: PaymentState;
  fulfilment: FulfilmentState;
  paidAt: number | null;
  /** When the last part of the last box was picked, where all are. */
  pickedAt: number | null;
  /** When the last box was closed, where all are. */
  packedAt: number | null;
  shippedAt: number | null;
  promise: string;
  boxes: { all: number; closed: number };
  tracking: string | null;
}

/** The five stages a customer reads. The first that is not done is where the order stands now. */
export function timelineOf(facts: Facts): Stage[] {
  const { paidAt, shippedAt } = facts;
  const packedAt = facts.packedAt ?? shippedAt;
  const pickedAt = facts.pickedAt ?? packedAt;
  const boxes = `${facts.boxes.closed} of ${facts.boxes.all} boxes closed`;
  const stages: Omit<Stage, 'state'>[] = [
    { name: 'Paid', at: paidAt, note: paidAt === null ? 'Waiting for payment' : 'By card' },
    { name: 'Picked', at: pickedAt, note: pickedAt === null ? 'From the bins' : 'Every part scanned' },
    { name: 'Packed', at: packedAt, note: packedAt === null && facts.boxes.all > 0 ? boxes : 'Weighed and closed' },
    { name: 'Sent', at: shippedAt, note: facts.tracking ?? 'To the carrier' },
    {
      name: 'Delivered',
      at: null,
      note: shippedAt === null ? `Takes ${facts.promise}` : `Expected in ${facts.promise}`,
    },
  ];
  let last = -1;
  stages.forEach((stage, index) => {
    if (stage.at !== null) last = index;
  });
  return stages.map((stage, index) => ({
    ...stage,
    state: index < last ? 'done' : index === last ? 'now' : 'waiting',
  }));
}

/** The sentence that heads an order's page, and the one under it. */
export function headlineOf(facts: Facts): { headline: string; lead: string } {
  const { payment, fulfilment, promise } = facts;
  if (payment === 'refunded' && fulfilment !== 'cancelled') {
    return {
      headline: 'Paid back.',
      lead: 'The whole of it is on its way to the card it came from. Banks take up to ten days.',
    };
  }
  if (payment === 'refunded') {
    return {
      headline: 'Cancelled, and paid back.',
      lead: 'The money is on its way to the card it came from. Banks take up to ten days.',
    };
  }
  if (fulfilment === 'cancelled') {
    return payment === 'cancelled'
      ? { headline: 'Cancelled.', lead: 'Nothing was taken from your card.' }
      : { headline: 'Cancelled.', lead: 'We have asked your bank to take the money back to your card.' };
  }
  if (payment === 'awaiting-payment') {
    return {
      headline: 'Not paid yet.',
      lead: 'We set your kits aside while you pay. Nothing is sent before the money is here.',
    };
  }
  switch (fulfilment) {
    case 'shipped':
      return { headline: 'Sent, and on its way.', lead: `Expect it in ${promise}.` };
    case 'packed':
      return {
        headline: 'Packed, and leaving next.',
        lead: 'Every box is weighed and closed. The carrier takes it on the next round.',
      };
    case 'picking':
      return {
        headline: 'On the packing table.',
        lead: 'A packer is putting the parts into your boxes, one scan a part.',
      };
    case 'backordered':
      return {
        headline: 'Paid, but we are short of a part.',
        lead: 'Your payment came after the time we kept your kits for you, and the last ones had gone. Wait for the next delivery and we send it then, or cancel and have your money back.',
      };
    default:
      return {
        headline: 'Paid, and set aside for you.',
        lead: `The packers take it next. After it is sent, it takes ${promise}.`,
      };
  }
}

/** A postcode that looks odd for its country is pointed out, never refused: lists of patterns go out of date. */
const patterns: Record<string, { like: RegExp; example: string }> = {
  GB: { like: /^[A-Z]{1,2}\d[A-Z\d]? ?\d[A-Z]{2}$/, example: 'PL3 4RT' },
  US: { like: /^\d{5}(-\d{4})?$/, example: '04630' },
  DE: { like: /^\d{5}$/, example: '01067' },
  FR: { like: /^\d{5}$/, example: '29200' },
  NL: { like: /^\d{4} ?[A-Z]{2}$/, example: '1011 AB' },
};

export function postcodeWarning(country: string, postcode: string): string | null {
  const pattern = patterns[country];
  const given = postcode.trim().toUpperCase();
  if (!pattern || pattern.like.test(given)) return null;
  return given === ''
    ? `Most addresses there have a postcode, like ${pattern.example}. Leave it empty if yours has none.`
    : `This is not the usual form there, like ${pattern.example}. Keep it if it is right.`;
}

/** Which delivery serves a country: one that names it, or one for everywhere else where none does. */
export function deliveriesTo<M extends { countries: readonly string[] }>(methods: readonly M[], country: string): M[] {
  const named = methods.filter((method) => method.countries.includes(country));
  return named.length > 0 ? named : methods.filter((method) => method.countries.includes('*'));
}
