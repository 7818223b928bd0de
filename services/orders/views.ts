import type { Knex } from 'knex';
import { type Actor, can, must } from '../access';
import { OrderId, type VersionId } from '../ids';
import { readFrozen } from '../kits';
import { type Currency, type Money, money, times } from '../money';
import { Problem, missing, parse } from '../problem';
import { now, reading } from '../record';
import { liveReservation } from '../stock';
import { boxesOf, packingTimes } from './box-rows';
import { orderLink } from './link';
import { openOrder, ownership } from './order-access';
import { lastEventOf, shipmentsOf } from './order-facts';
import * as rows from './rows';
import { headlineOf, mayCancel, mayPay, timelineOf } from './rules';
import { Invoice, type OrderLine, OrderRef, OrderView } from './schemas';

/** One order as its buyer, or somebody of the yard, sees it. */
export async function readOrder(actor: Actor, input: OrderRef): Promise<OrderView> {
  const ref = parse(OrderRef, input);
  const sql = reading();
  const order = await openOrder(sql, actor, 'order.read', ref);
  const owned = ownership(order, ref.key);
  const [lines, boxes, shipments, deliveries, cash, invoice, lastEvent] = [
    await rows.linesOf(sql, order.id),
    await boxesOf(sql, order.id),
    await shipmentsOf(sql, order.id),
    await rows.deliveries(sql),
    await rows.moneyOf(sql, order.id),
    await invoiceOf(sql, order.id),
    await lastEventOf(sql, order.id),
  ];
  const reservation = await liveReservation(sql, order.id);
  const method = deliveries.find((one) => one.code === order.deliveryCode);
  const promise = method?.promise ?? 'a few working days';
  const facts = {
    payment: order.payment,
    fulfilment: order.fulfilment,
    paidAt: order.paidAt,
    ...(await packingTimes(sql, order.id)),
    shippedAt: order.shippedAt,
    promise,
    boxes: {
      all: boxes.length,
      closed: boxes.filter((box) => box.state === 'closed' || box.state === 'shipped').length,
    },
    tracking: shipments[0] ? `${shipments[0].carrier}, ${shipments[0].trackingNumber}` : null,
  };
  return OrderView.parse({
    id: order.id,
    number: order.number,
    email: order.email,
    name: order.name,
    address: order.address,
    giftNote: order.giftNote,
    delivery: { code: order.deliveryCode, name: method?.name ?? order.deliveryCode, promise },
    payment: order.payment,
    fulfilment: order.fulfilment,
    placedAt: order.placedAt,
    paidAt: order.paidAt,
    shippedAt: order.shippedAt,
    lines: await linesFor(sql, lines, order.currency),
    linesTotal: order.lines,
    deliveryPrice: order.delivery,
    tax: order.tax,
    taxBasisPoints: order.taxBasisPoints,
    total: order.total,
    paid: money(cash.paidMinor, order.currency),
    refunded: money(cash.refundedMinor, order.currency),
    ...headlineOf(facts),
    timeline: timelineOf(facts),
    boxes,
    invoice,
    shipments,
    keptUntil: reservation?.state === 'reserved' && reservation.expiresAt > now() ? reservation.expiresAt : null,
    bankSaidNo: order.payment === 'awaiting-payment' && lastEvent === 'payment_intent.payment_failed',
    may: {
      pay: mayPay(order) && can(actor, 'order.pay', owned),
      cancel: mayCancel(order) && can(actor, 'order.cancel', owned),
      claim: order.customerId === null && owned.holdsLink && can(actor, 'order.claim', owned),
    },
    lookAtIt: can(actor, 'order.list') && order.lookAtIt !== '' ? order.lookAtIt : null,
  });
}

function linesFor(sql: Knex, lines: readonly rows.StoredLine[], currency: Currency): Promise<OrderLine[]> {
  return Promise.all(
    lines.map(async ({ versionId, code, kitNumber, name, letter, quantity, unitMinor }) => {
      const unit = money(unitMinor, currency);
      const set = await setOf(sql, versionId);
      return { versionId, code, number: kitNumber, name, letter, quantity, unit, total: times(unit, quantity), set };
    }),
  );
}

/** Old orders stay readable whatever became of their version; what cannot be vouched for is left out. */
async function setOf(sql: Knex, versionId: VersionId): Promise<OrderLine['set']> {
  try {
    const { kit, circuit } = (await readFrozen(sql, versionId)).content;
    return {
      tunes: { lo: kit.band.firstCarrier, hi: kit.band.lastCarrier },
      aerialMetres: Math.round(circuit.aerial.vertical + circuit.aerial.horizontal),
      earth: circuit.earth.kind !== 'none',
    };
  } catch (error) {
    if (error instanceof Problem) return null;
    throw error;
  }
}

async function invoiceOf(sql: Knex, orderId: string): Promise<{ id: string; number: number } | null> {
  const row = await sql('invoices')
    .where({ order_id: orderId })
    .select('id', 'number')
    .first<{ id: string; number: number } | undefined>();
  return row ?? null;
}

/** An issued invoice as it was frozen, for its buyer or the owner. */
export async function readInvoice(
  actor: Actor,
  input: { invoiceId: string; key?: string | undefined },
): Promise<Invoice> {
  const sql = reading();
  const row = await sql('invoices')
    .where({ id: input.invoiceId })
    .select({ orderId: 'order_id', content: 'content' })
    .first<{ orderId: string; content: string } | undefined>();
  if (!row) throw missing('There is no invoice here for you. Open it from the order it belongs to.');
  const ref = { orderId: OrderId.parse(row.orderId), ...(input.key !== undefined && { key: input.key }) };
  await openOrder(sql, actor, 'paper.invoice', ref);
  return Invoice.parse(JSON.parse(row.content));
}

export interface OrderForMail {
  number: string;
  email: string;
  name: string;
  lines: { name: string; letter: string; quantity: number; unit: Money }[];
  total: Money;
  link: string;
  shipment?: { carrier: string; trackingNumber: string };
}

/** What a mail about an order says, read fresh when the mail is written. */
export async function readOrderForMail(actor: Actor, orderId: string): Promise<OrderForMail> {
  must(actor, 'mail.send');
  const sql = reading();
  const order = await rows.getOrder(sql, orderId);
  const shipment = (await shipmentsOf(sql, orderId)).at(-1);
  return {
    number: order.number,
    email: order.email,
    name: order.name,
    lines: (await rows.linesOf(sql, orderId)).map(({ name, letter, quantity, unitMinor }) => ({
      name,
      letter,
      quantity,
      unit: money(unitMinor, order.currency),
    })),
    total: order.total,
    link: orderLink(orderId),
    ...(shipment && { shipment: { carrier: shipment.carrier, trackingNumber: shipment.trackingNumber } }),
  };
}
