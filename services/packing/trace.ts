import type { Knex } from 'knex';
import { type Actor, can, must } from '../access';
import { readSignOff } from '../check';
import { frozenContent } from '../kits';
import { missing, Problem } from '../problem';
import { reading } from '../record';
import { plateOf } from './box-view';
import { findLot } from './lot-rows';
import { type BoxRow, boxes, findBoxBySerial, linesOf, storedAddress } from './rows';
import { amountText } from './rules';
import type { LotTrace, TraceView } from './schemas';

/** From a box to its version, sign-off, lots and packers. The buyer is named only to those who send or answer for it. */
export async function traceBox(actor: Actor, serial: string): Promise<TraceView> {
  must(actor, 'box.trace');
  const sql = reading();
  const box = await findBoxBySerial(sql, serial.trim().toUpperCase());
  if (!box) throw missing('No box has this serial. Its last character is a check: read the label again.');
  const hash = await contentHashOf(sql, box);
  const signOff = await readSignOff(sql, box.versionId);
  return {
    serial: box.serial,
    boxId: box.id,
    state: box.state,
    plate: plateOf(box),
    versionId: box.versionId,
    versionState: box.versionState,
    ...hash,
    signOff: signOff && {
      by: signOff.by,
      at: signOff.at,
      engineVersion: signOff.engineVersion,
      rulesVersion: signOff.rulesVersion,
      covers: signOff.contentHash === hash.contentHash,
    },
    orderNumber: box.orderNumber,
    buyer: can(actor, 'box.list') ? await buyerOf(sql, box) : null,
    packedBy: box.closedName ?? box.claimedName,
    closedAt: box.closedAt,
    massMilligrams: box.weighedMilligrams,
    shipment: await shipmentOf(sql, box),
    lines: await tracedLines(sql, box),
  };
}

/** The hash on record, and whether the content still has it. */
async function contentHashOf(sql: Knex, box: BoxRow): Promise<Pick<TraceView, 'contentHash' | 'contentHolds'>> {
  try {
    const { contentHash } = await frozenContent(sql, box.versionId);
    return { contentHash, contentHolds: true };
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    const row = await sql('versions')
      .where('id', box.versionId)
      .first<{ hash: string | null }>({ hash: 'content_hash' });
    return { contentHash: row?.hash ?? '', contentHolds: false };
  }
}

async function buyerOf(sql: Knex, box: BoxRow): Promise<TraceView['buyer']> {
  const order = await sql('orders')
    .where('id', box.orderId)
    .first<{ name: string; email: string; address: string } | undefined>('name', 'email', 'address');
  return order ? { name: order.name, email: order.email, address: storedAddress(order.address) } : null;
}

async function shipmentOf(sql: Knex, box: BoxRow): Promise<TraceView['shipment']> {
  if (box.shipmentId === null) return null;
  const row = await sql('shipments')
    .where('id', box.shipmentId)
    .first<{ carrier: string; trackingNumber: string; at: number } | undefined>({
      carrier: 'carrier',
      trackingNumber: 'tracking_number',
      at: 'shipped_at',
    });
  return row ?? null;
}

type TracedLot = TraceView['lines'][number]['lots'][number];
type TracedPick = Omit<TracedLot, 'amount' | 'blocked'> & { lineId: string; state: string; quantity: number };

const picksIn = (sql: Knex, boxId: string): Promise<TracedPick[]> =>
  sql('box_picks')
    .join('lots', 'lots.id', 'box_picks.lot_id')
    .join('bins', 'bins.id', 'box_picks.bin_id')
    .join('people', 'people.id', 'box_picks.person_id')
    .where('box_picks.box_id', boxId)
    .orderBy(['box_picks.at', 'box_picks.id'])
    .select({
      lineId: 'box_picks.box_line_id',
      lotId: 'lots.id',
      lotCode: 'lots.code',
      supplier: 'lots.supplier',
      receivedAt: 'lots.received_at',
      state: 'lots.state',
      binCode: 'bins.code',
      quantity: 'box_picks.quantity',
      by: 'people.name',
      at: 'box_picks.at',
    });

async function tracedLines(sql: Knex, box: BoxRow): Promise<TraceView['lines']> {
  const picks = await picksIn(sql, box.id);
  return (await linesOf(sql, [box.id])).map((line) => ({
    reference: line.reference,
    partCode: line.partCode,
    name: line.name,
    kind: line.kind,
    needed: amountText(line.needed, line.unit),
    lots: sumByLot(picks.filter((pick) => pick.lineId === line.id)).map(
      ({ lineId: _line, state, quantity, ...lot }) => ({
        ...lot,
        blocked: state === 'blocked',
        amount: amountText(quantity, line.unit),
      }),
    ),
  }));
}

/** What stayed in the box of each lot and bin; who and when are the last pick's. */
function sumByLot(picks: readonly TracedPick[]): TracedPick[] {
  const sums = new Map<string, TracedPick>();
  for (const pick of picks) {
    const key = `${pick.lotId} ${pick.binCode}`;
    const before = sums.get(key);
    const quantity = (before?.quantity ?? 0) + pick.quantity;
    sums.set(key, pick.quantity > 0 || !before ? { ...pick, quantity } : { ...before, quantity });
  }
  return [...sums.values()].filter((sum) => sum.quantity > 0);
}

/** From a lot to every box that a piece of it stayed in. */
export async function traceLot(actor: Actor, code: string): Promise<LotTrace> {
  must(actor, 'box.trace');
  const sql = reading();
  const lot = await findLot(sql, code.trim().toUpperCase());
  if (!lot) throw missing('No lot has this code. Read its label again.');
  const part = await sql('parts').where('id', lot.partId).first<{ unit: 'each' | 'metre' | 'gram' }>('unit');
  const sums: { boxId: string; quantity: number }[] = await sql('box_picks')
    .where('lot_id', lot.id)
    .groupBy('box_id')
    .select({ boxId: 'box_id' })
    .sum({ quantity: 'quantity' });
  const quantities = new Map(sums.filter((sum) => sum.quantity > 0).map((sum) => [sum.boxId, sum.quantity]));
  const rows = await boxes(sql)
    .whereIn('boxes.id', [...quantities.keys()])
    .orderBy('boxes.serial');
  const knowsBuyer = can(actor, 'box.list');
  return {
    lotCode: lot.code,
    partCode: lot.partCode,
    name: lot.name,
    supplier: lot.supplier,
    receivedAt: lot.receivedAt,
    state: lot.state,
    boxes: rows.map((row) => ({
      serial: row.serial,
      plate: plateOf(row),
      state: row.state,
      orderNumber: row.orderNumber,
      buyer: knowsBuyer ? row.buyer : null,
      amount: amountText(quantities.get(row.id) ?? 0, part?.unit ?? 'each'),
    })),
  };
}
