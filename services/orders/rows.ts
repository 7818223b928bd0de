import type { Knex } from 'knex';
import { OrderId, VersionId } from '../ids';
import { missing } from '../problem';
import { Currency, type Money, money } from '../money';
import { Address, FulfilmentState, PaymentState } from './schemas';

const orderColumns = {
  id: 'orders.id',
  number: 'orders.number',
  customerId: 'orders.customer_id',
  email: 'orders.email',
  name: 'orders.name',
  linkHash: 'orders.link_hash',
  address: 'orders.address',
  deliveryCode: 'orders.delivery_code',
  giftNote: 'orders.gift_note',
  payment: 'orders.payment',
  fulfilment: 'orders.fulfilment',
  currency: 'orders.currency',
  linesMinor: 'orders.lines_minor',
  deliveryMinor: 'orders.delivery_minor',
  taxMinor: 'orders.tax_minor',
  taxBasisPoints: 'orders.tax_basis_points',
  totalMinor: 'orders.total_minor',
  placedAt: 'orders.placed_at',
  paidAt: 'orders.paid_at',
  shippedAt: 'orders.shipped_at',
  sessionId: 'orders.session_id',
  sessionAttempt: 'orders.session_attempt',
  lookAtIt: 'orders.look_at_it',
} as const;

interface StoredOrder {
  id: string;
  number: string;
  customerId: string | null;
  email: string;
  name: string;
  linkHash: string;
  address: string;
  deliveryCode: string;
  giftNote: string;
  payment: string;
  fulfilment: string;
  currency: string;
  linesMinor: number;
  deliveryMinor: number;
  taxMinor: number;
  taxBasisPoints: number;
  totalMinor: number;
  placedAt: number;
  paidAt: number | null;
  shippedAt: number | null;
  sessionId: string | null;
  sessionAttempt: number;
  lookAtIt: string;
}

export interface Order extends Omit<
  StoredOrder,
  'id' | 'address' | 'payment' | 'fulfilment' | 'currency' | 'linesMinor' | 'deliveryMinor' | 'taxMinor' | 'totalMinor'
> {
  id: OrderId;
  address: Address;
  payment: PaymentState;
  fulfilment: FulfilmentState;
  currency: Currency;
  lines: Money;
  delivery: Money;
  tax: Money;
  total: Money;
}

function toOrder(row: StoredOrder): Order {
  const { linesMinor, deliveryMinor, taxMinor, totalMinor, ...rest } = row;
  const currency = Currency.parse(row.currency);
  return {
    ...rest,
    id: OrderId.parse(row.id),
    address: Address.parse(JSON.parse(row.address)),
    payment: PaymentState.parse(row.payment),
    fulfilment: FulfilmentState.parse(row.fulfilment),
    currency,
    lines: money(linesMinor, currency),
    delivery: money(deliveryMinor, currency),
    tax: money(taxMinor, currency),
    total: money(totalMinor, currency),
  };
}

export async function findOrder(sql: Knex, id: string): Promise<Order | null> {
  const row = await sql('orders').where({ id }).select(orderColumns).first<StoredOrder | undefined>();
  return row ? toOrder(row) : null;
}

export async function getOrder(sql: Knex, id: string): Promise<Order> {
  const order = await findOrder(sql, id);
  if (!order) throw missing('There is no order with this id.');
  return order;
}

export interface StoredLine {
  id: string;
  versionId: VersionId;
  kitId: string;
  code: string;
  kitNumber: number;
  name: string;
  letter: string;
  quantity: number;
  unitMinor: number;
}

export async function linesOf(sql: Knex, orderId: string): Promise<StoredLine[]> {
  const rows = await sql('order_lines')
    .join('versions', 'versions.id', 'order_lines.version_id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .where({ 'order_lines.order_id': orderId })
    .orderBy('order_lines.position')
    .select<(Omit<StoredLine, 'versionId'> & { versionId: string })[]>({
      id: 'order_lines.id',
      versionId: 'versions.id',
      kitId: 'kits.id',
      code: 'kits.code',
      kitNumber: 'kits.number',
      name: 'kits.name',
      letter: 'versions.letter',
      quantity: 'order_lines.quantity',
      unitMinor: 'order_lines.unit_minor',
    });
  return rows.map((row) => ({ ...row, versionId: VersionId.parse(row.versionId) }));
}

/** Moves an order's states on; false when they are no longer what the decision was made on. */
export async function moveOrder(
  sql: Knex.Transaction,
  order: Pick<Order, 'id' | 'payment' | 'fulfilment'>,
  to: { payment?: PaymentState; fulfilment?: FulfilmentState; paidAt?: number },
): Promise<boolean> {
  const { id, payment, fulfilment } = order;
  const changed = await sql('orders')
    .where({ id, payment, fulfilment })
    .update({
      payment: to.payment ?? payment,
      fulfilment: to.fulfilment ?? fulfilment,
      ...(to.paidAt !== undefined && { paid_at: to.paidAt }),
    });
  return changed === 1;
}

/** Adds a sentence for whoever has to look at the order; false when it stands there already. */
export async function addToLookAt(sql: Knex.Transaction, orderId: string, sentence: string): Promise<boolean> {
  const row = await sql('orders')
    .where({ id: orderId })
    .select({ said: 'look_at_it' })
    .first<{ said: string } | undefined>();
  if (!row || row.said.includes(sentence)) return false;
  await sql('orders')
    .where({ id: orderId })
    .update({ look_at_it: `${row.said} ${sentence}`.trim() });
  return true;
}

export async function moneyOf(sql: Knex, orderId: string): Promise<{ paidMinor: number; refundedMinor: number }> {
  const rows = await sql('order_money')
    .where({ order_id: orderId })
    .select<{ kind: string; minor: number }[]>({ kind: 'kind', minor: 'amount_minor' });
  const sum = (kind: string) => rows.filter((row) => row.kind === kind).reduce((all, row) => all + row.minor, 0);
  return { paidMinor: sum('paid'), refundedMinor: sum('refunded') };
}

/** The order's payments by the provider's id, first one first. */
export async function paymentsOf(sql: Knex, orderId: string): Promise<{ reference: string; minor: number }[]> {
  return sql('order_money')
    .where({ order_id: orderId, kind: 'paid' })
    .orderBy('at')
    .select<{ reference: string; minor: number }[]>({ reference: 'reference', minor: 'amount_minor' });
}

/** Books a movement of money; false when it is booked already. */
export async function bookMoney(
  sql: Knex.Transaction,
  row: { id: string; orderId: string; kind: 'paid' | 'refunded'; amount: Money; reference: string; at: number },
): Promise<boolean> {
  const known = await sql('order_money')
    .where({ reference: row.reference })
    .select('id')
    .first<{ id: string } | undefined>();
  if (known) return false;
  await sql('order_money').insert({
    id: row.id,
    order_id: row.orderId,
    kind: row.kind,
    amount_minor: row.amount.minor,
    currency: row.amount.currency,
    reference: row.reference,
    at: row.at,
  });
  return true;
}

/** The next number of a series, taken inside the transaction that uses it: no gap, no repeat. */
export async function nextNumber(sql: Knex.Transaction, series: 'order' | 'invoice', first: number): Promise<number> {
  await sql('counters')
    .insert({ name: series, value: first - 1 })
    .onConflict('name')
    .ignore();
  await sql('counters').where({ name: series }).increment('value', 1);
  const row = await sql('counters').where({ name: series }).select('value').first<{ value: number } | undefined>();
  if (!row) throw new Error(`The counter ${series} is gone.`);
  return row.value;
}

export async function taxRate(sql: Knex, country: string): Promise<number> {
  const row = await sql('tax_rates')
    .where({ country })
    .select({ rate: 'basis_points' })
    .first<{ rate: number } | undefined>();
  return row?.rate ?? 0;
}

export async function taxRates(sql: Knex): Promise<{ country: string; basisPoints: number }[]> {
  return sql('tax_rates')
    .orderBy('country')
    .select<{ country: string; basisPoints: number }[]>({ country: 'country', basisPoints: 'basis_points' });
}

export interface StoredDelivery {
  code: string;
  name: string;
  promise: string;
  countries: string[];
  price: Money;
}

export async function deliveries(sql: Knex): Promise<StoredDelivery[]> {
  const rows = await sql('delivery_methods')
    .orderBy(['position', 'code'])
    .select<{ code: string; name: string; promise: string; countries: string; minor: number; currency: string }[]>({
      code: 'code',
      name: 'name',
      promise: 'promise',
      countries: 'countries',
      minor: 'price_minor',
      currency: 'currency',
    });
  return rows.map(({ countries, minor, currency, ...row }) => ({
    ...row,
    countries: countries.split(','),
    price: money(minor, Currency.parse(currency)),
  }));
}

/** What is booked as paid back of one charge. */
export async function refundedOfCharge(sql: Knex, orderId: string, charge: string): Promise<number> {
  const rows = await sql('order_money')
    .where({ order_id: orderId, kind: 'refunded' })
    .select<{ reference: string; minor: number }[]>({ reference: 'reference', minor: 'amount_minor' });
  return rows.filter((row) => row.reference.startsWith(`${charge}/`)).reduce((all, row) => all + row.minor, 0);
}

/** Paid orders that wait for stock, oldest payment first. */
export async function backordered(sql: Knex): Promise<Order[]> {
  const found = await sql('orders')
    .where({ fulfilment: 'backordered' })
    .whereIn('payment', ['paid', 'part-refunded'])
    .orderBy(['paid_at', 'id'])
    .select<StoredOrder[]>(orderColumns);
  return found.map(toOrder);
}

/** Unpaid orders with a payment page, placed between two moments: the reconciler looks each of them up. */
export async function pending(sql: Knex, from: number, to: number): Promise<Order[]> {
  const found = await sql('orders')
    .where({ payment: 'awaiting-payment' })
    .andWhere('placed_at', '>=', from)
    .andWhere('placed_at', '<=', to)
    .whereNotNull('session_id')
    .orderBy(['placed_at', 'id'])
    .select<StoredOrder[]>(orderColumns);
  return found.map(toOrder);
}

/** Cancelled orders whose money is still here. */
export async function owedBack(sql: Knex): Promise<Order[]> {
  const found = await sql('orders')
    .where({ fulfilment: 'cancelled' })
    .whereIn('payment', ['paid', 'part-refunded'])
    .orderBy(['payment', 'placed_at', 'id'])
    .select<StoredOrder[]>(orderColumns);
  return found.map(toOrder);
}

export async function orderOfPayment(sql: Knex, reference: string): Promise<string | null> {
  const row = await sql('order_money')
    .where({ reference, kind: 'paid' })
    .select({ orderId: 'order_id' })
    .first<{ orderId: string } | undefined>();
  return row?.orderId ?? null;
}
