import { type Actor, must } from '../access';
import { frozenContent } from '../kits';
import type { VersionContent } from '../kits/schemas';
import { log } from '../log';
import { type VersionId, newId } from '../ids';
import { Problem } from '../problem';
import { type Tx, reading, record, write } from '../record';
import { lotsOf } from './lot-rows';
import { nextCount } from './rows';
import { expectedMass } from './mass';
import { suggest } from './rules';
import { serialOf } from './serial';

/**
 * Gives every allocated order its boxes, one a kit, when somebody first looks for boxes (and from the worker, every few
 * seconds). Each order is a transaction of its own; one whose version no longer matches its hash is left without boxes.
 */
export async function prepareBoxes(actor: Actor): Promise<{ made: number }> {
  must(actor, 'box.prepare');
  const waiting = await ordersWithoutBoxes();
  let made = 0;
  for (const orderId of waiting) {
    try {
      made += await write(actor, (tx) => makeBoxesFor(tx, orderId));
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      log().error({ orderId, sentence: error.message }, 'an order cannot be packed');
    }
  }
  return { made };
}

const ordersWithoutBoxes = (): Promise<string[]> =>
  reading()('orders')
    .where('orders.fulfilment', 'allocated')
    .whereNotExists(reading()('boxes').select('boxes.id').where('boxes.order_id', reading().ref('orders.id')))
    .orderBy(['orders.paid_at', 'orders.id'])
    .limit(50)
    .pluck('orders.id');

/** A step: makes the boxes of one order with their serials, lines and expected mass. Made once; a second call makes none. */
export async function makeBoxesFor(tx: Tx, orderId: string): Promise<number> {
  const order = await tx.sql('orders').where({ id: orderId, fulfilment: 'allocated' }).first('id');
  const there = await tx.sql('boxes').where('order_id', orderId).first('id');
  if (!order || there) return 0;

  const lines = await tx
    .sql('order_lines')
    .join('versions', 'versions.id', 'order_lines.version_id')
    .where('order_lines.order_id', orderId)
    .orderBy('order_lines.position')
    .select<{ id: string; versionId: VersionId; quantity: number }[]>({
      id: 'order_lines.id',
      versionId: 'order_lines.version_id',
      quantity: 'order_lines.quantity',
    });
  let position = 0;
  for (const line of lines) {
    const { content } = await frozenContent(tx.sql, line.versionId);
    const places = await placesOf(tx, content);
    for (let one = 0; one < line.quantity; one++) {
      position += 1;
      await insertBox(tx, { orderId, line, content, position, places });
    }
  }
  return position;
}

interface Place {
  reference: string;
  partId: string;
  needed: number;
}

/** What goes into a box, in the order in which the bins are walked; prints come from the printer, not from a bin. */
async function placesOf(tx: Tx, content: VersionContent): Promise<Place[]> {
  const picked = content.lines.filter((line) => line.part && line.part.values.kind !== 'print');
  const codes = picked.map((line) => line.part?.code ?? '');
  const parts = await tx.sql('parts').whereIn('code', codes).select<{ id: string; code: string }[]>('id', 'code');
  const idOf = new Map(parts.map((part) => [part.code, part.id]));
  const lots = await lotsOf(tx.sql, [...idOf.values()]);

  const places = picked.map((line) => {
    const partId = idOf.get(line.part?.code ?? '');
    if (partId === undefined) throw new Problem('missing', `Part ${line.part?.code ?? ''} is not in the parts list.`);
    const need = { unit: line.part?.unit ?? 'each', needed: line.quantity, packed: 0, toldEmptyBinId: null } as const;
    const lot = suggest(
      lots.filter((one) => one.partId === partId),
      need,
    );
    return {
      reference: line.reference,
      partId,
      needed: line.quantity,
      walk: lot?.binPosition ?? Number.MAX_SAFE_INTEGER,
    };
  });
  return places.sort((a, b) => a.walk - b.walk || (a.reference < b.reference ? -1 : 1));
}

interface NewBox {
  orderId: string;
  line: { id: string; versionId: string };
  content: VersionContent;
  position: number;
  places: readonly Place[];
}

async function insertBox(tx: Tx, { orderId, line, content, position, places }: NewBox): Promise<void> {
  const id = newId();
  const serial = serialOf(content.kit.code, content.letter, await nextCount(tx, 'box-serial'));
  await tx.sql('boxes').insert({
    id,
    serial,
    order_id: orderId,
    order_line_id: line.id,
    version_id: line.versionId,
    position,
    state: 'to-pack',
    claimed_by: null,
    claimed_at: null,
    expected_milligrams: expectedMass(content),
    weighed_milligrams: null,
    slip_printed_at: null,
    guide_printed_at: null,
    guide_scanned_at: null,
    closed_by: null,
    closed_at: null,
    shipment_id: null,
  });
  for (const [index, place] of places.entries()) {
    await tx.sql('box_lines').insert({
      id: newId(),
      box_id: id,
      reference: place.reference,
      part_id: place.partId,
      needed: place.needed,
      packed: 0,
      position: index + 1,
      told_empty_at: null,
      told_empty_bin_id: null,
    });
  }
  await record(tx, 'box.made', { subject: { kind: 'box', id }, after: { serial, orderId, versionId: line.versionId } });
}
