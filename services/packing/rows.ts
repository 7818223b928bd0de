import type { Knex } from 'knex';
import type { BoxId, LineId, OrderId, VersionId } from '../ids';
import { newId } from '../ids';
import type { VersionState } from '../kits/schemas';
import { Address } from '../orders/schemas';
import type { PartUnit } from '../parts/schemas';
import { missing } from '../problem';
import type { Tx } from '../record';
import type { Instant } from '../time';
import { type Fulfilment, addressLines, claimHolds } from './rules';
import type { BoxState } from './schemas';

/** A box row with the names a person needs around it. */
export interface BoxRow {
  id: BoxId;
  serial: string;
  orderId: OrderId;
  orderNumber: string;
  buyer: string;
  paidAt: Instant | null;
  placedAt: Instant;
  fulfilment: Fulfilment;
  payment: string;
  versionId: VersionId;
  kitNumber: number;
  kitCode: string;
  kitName: string;
  letter: string;
  versionState: VersionState;
  position: number;
  of: number;
  state: BoxState;
  claimedBy: string | null;
  claimedName: string | null;
  claimedAt: Instant | null;
  expectedMilligrams: number;
  weighedMilligrams: number | null;
  slipPrintedAt: Instant | null;
  guidePrintedAt: Instant | null;
  guideScannedAt: Instant | null;
  closedAt: Instant | null;
  closedName: string | null;
  shipmentId: string | null;
}

/** Every read of boxes joins the same five tables; what differs is which boxes and in which order. */
export const boxes = (sql: Knex) =>
  sql('boxes')
    .join('orders', 'orders.id', 'boxes.order_id')
    .join('versions', 'versions.id', 'boxes.version_id')
    .join('kits', 'kits.id', 'versions.kit_id')
    .leftJoin('people as packers', 'packers.id', 'boxes.claimed_by')
    .leftJoin('people as closers', 'closers.id', 'boxes.closed_by')
    .select<BoxRow[]>({
      id: 'boxes.id',
      serial: 'boxes.serial',
      orderId: 'boxes.order_id',
      orderNumber: 'orders.number',
      buyer: 'orders.name',
      paidAt: 'orders.paid_at',
      placedAt: 'orders.placed_at',
      fulfilment: 'orders.fulfilment',
      payment: 'orders.payment',
      versionId: 'boxes.version_id',
      kitNumber: 'kits.number',
      kitCode: 'kits.code',
      kitName: 'kits.name',
      letter: 'versions.letter',
      versionState: 'versions.state',
      position: 'boxes.position',
      state: 'boxes.state',
      claimedBy: 'boxes.claimed_by',
      claimedName: 'packers.name',
      claimedAt: 'boxes.claimed_at',
      expectedMilligrams: 'boxes.expected_milligrams',
      weighedMilligrams: 'boxes.weighed_milligrams',
      slipPrintedAt: 'boxes.slip_printed_at',
      guidePrintedAt: 'boxes.guide_printed_at',
      guideScannedAt: 'boxes.guide_scanned_at',
      closedAt: 'boxes.closed_at',
      closedName: 'closers.name',
      shipmentId: 'boxes.shipment_id',
    })
    .select(sql('boxes as siblings').count('*').where('siblings.order_id', sql.ref('boxes.order_id')).as('of'));

export async function findBox(sql: Knex, boxId: string): Promise<BoxRow | undefined> {
  return boxes(sql).where('boxes.id', boxId).first();
}

export async function getBox(sql: Knex, boxId: string): Promise<BoxRow> {
  const row = await findBox(sql, boxId);
  if (!row) throw missing('There is no such box. Look for it under Boxes, or scan its serial under Trace.');
  return row;
}

export async function findBoxBySerial(sql: Knex, serial: string): Promise<BoxRow | undefined> {
  return boxes(sql).where('boxes.serial', serial).first();
}

/** The address of an order as lines of a label. */
export const storedAddress = (text: string): string[] => addressLines(Address.parse(JSON.parse(text)));

export const boxesOf = (sql: Knex, orderId: string): Promise<BoxRow[]> =>
  boxes(sql).where('boxes.order_id', orderId).orderBy('boxes.position');

export async function hasOpenBoxes(sql: Knex, orderId: string): Promise<boolean> {
  const open = await sql('boxes').where('order_id', orderId).whereIn('state', ['to-pack', 'packing']).first('id');
  return open !== undefined;
}

export interface BoxLineRow {
  id: LineId;
  boxId: BoxId;
  reference: string;
  partId: string;
  partCode: string;
  name: string;
  kind: string;
  /** As stored: JSON of the kind's values. */
  values: string;
  unit: PartUnit;
  needed: number;
  packed: number;
  position: number;
  toldEmptyAt: Instant | null;
  toldEmptyBinId: string | null;
}

export function linesOf(sql: Knex, boxIds: readonly string[]): Promise<BoxLineRow[]> {
  return sql('box_lines')
    .join('parts', 'parts.id', 'box_lines.part_id')
    .whereIn('box_lines.box_id', boxIds)
    .orderBy(['box_lines.box_id', 'box_lines.position'])
    .select<BoxLineRow[]>({
      id: 'box_lines.id',
      boxId: 'box_lines.box_id',
      reference: 'box_lines.reference',
      partId: 'box_lines.part_id',
      partCode: 'parts.code',
      name: 'parts.name',
      kind: 'parts.kind',
      values: 'parts.values',
      unit: 'parts.unit',
      needed: 'box_lines.needed',
      packed: 'box_lines.packed',
      position: 'box_lines.position',
      toldEmptyAt: 'box_lines.told_empty_at',
      toldEmptyBinId: 'box_lines.told_empty_bin_id',
    });
}

/** Takes a free box, one's own, or one whose claim has lapsed: one conditional update decides between two packers. */
export async function claim(tx: Tx, boxId: string, personId: string): Promise<boolean> {
  const changed = await tx
    .sql('boxes')
    .where('id', boxId)
    .whereIn('state', ['to-pack', 'packing'])
    .where((free) =>
      free
        .whereNull('claimed_by')
        .orWhere('claimed_by', personId)
        .orWhere('claimed_at', '<=', tx.now - claimHolds),
    )
    .update({ state: 'packing', claimed_by: personId, claimed_at: tx.now });
  return changed === 1;
}

/** Keeps the packer's claim alive with each thing done; false when the box is no longer in these hands. */
export async function keepClaim(tx: Tx, boxId: string, personId: string, set: object = {}): Promise<boolean> {
  const changed = await tx
    .sql('boxes')
    .where({ id: boxId, state: 'packing', claimed_by: personId })
    .update({ claimed_at: tx.now, ...set });
  return changed === 1;
}

/** Sets what a line has in the box, if it still has what the caller saw. */
export async function setPacked(tx: Tx, line: Pick<BoxLineRow, 'id' | 'packed'>, packed: number): Promise<boolean> {
  const changed = await tx
    .sql('box_lines')
    .where({ id: line.id, packed: line.packed })
    .update({ packed, told_empty_at: null, told_empty_bin_id: null });
  return changed === 1;
}

export interface Picked {
  boxId: BoxId;
  lineId: LineId;
  partId: string;
  lotId: string;
  binId: string;
  quantity: number;
  personId: string;
}

export async function insertPick(tx: Tx, pick: Picked): Promise<void> {
  await tx.sql('box_picks').insert({
    id: newId(),
    box_line_id: pick.lineId,
    box_id: pick.boxId,
    part_id: pick.partId,
    lot_id: pick.lotId,
    bin_id: pick.binId,
    quantity: pick.quantity,
    person_id: pick.personId,
    at: tx.now,
  });
}

export async function markToldEmpty(tx: Tx, lineId: string, binId: string): Promise<void> {
  await tx.sql('box_lines').where('id', lineId).update({ told_empty_at: tx.now, told_empty_bin_id: binId });
}

export async function setClosed(tx: Tx, boxId: string, personId: string): Promise<boolean> {
  const changed = await tx
    .sql('boxes')
    .where({ id: boxId, state: 'packing', claimed_by: personId })
    .update({ state: 'closed', closed_by: personId, closed_at: tx.now });
  return changed === 1;
}

export interface NewShipment {
  id: string;
  orderId: string;
  carrier: string;
  trackingNumber: string;
  personId: string;
}

/** Adds the parcel and marks the order's boxes as gone with it. */
export async function insertShipment(tx: Tx, shipment: NewShipment): Promise<void> {
  await tx.sql('shipments').insert({
    id: shipment.id,
    order_id: shipment.orderId,
    carrier: shipment.carrier,
    tracking_number: shipment.trackingNumber,
    shipped_at: tx.now,
    shipped_by: shipment.personId,
  });
  await tx
    .sql('boxes')
    .where({ order_id: shipment.orderId, state: 'closed' })
    .update({ state: 'shipped', shipment_id: shipment.id });
}

/** Moves an order's fulfilment when it still stands where expected. */
export async function moveOrder(tx: Tx, orderId: string, from: Fulfilment, to: Fulfilment): Promise<boolean> {
  const set = to === 'shipped' ? { fulfilment: to, shipped_at: tx.now } : { fulfilment: to };
  const changed = await tx.sql('orders').where({ id: orderId, fulfilment: from }).update(set);
  return changed === 1;
}

/** The next number of a counter: taken inside the transaction that uses it, never twice. */
export async function nextCount(tx: Tx, name: string): Promise<number> {
  await tx.sql('counters').insert({ name, value: 0 }).onConflict('name').ignore();
  await tx.sql('counters').where({ name }).increment('value', 1);
  const row = await tx.sql('counters').where({ name }).first<{ value: number }>('value');
  return row?.value ?? 0;
}
