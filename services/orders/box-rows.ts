import type { Knex } from 'knex';
import { BoxId, VersionId } from '../ids';
import type { OrderBox } from './schemas';

interface BoxRow {
  id: string;
  serial: string;
  versionId: string;
  state: OrderBox['state'];
}

interface ContentRow {
  boxId: string;
  reference: string;
  name: string;
  kind: string;
  quantity: number;
  unit: OrderBox['contents'][number]['unit'];
}

/** The boxes of an order and what goes into each, for its page. */
export async function boxesOf(sql: Knex, orderId: string): Promise<OrderBox[]> {
  const boxes = await sql('boxes')
    .where({ order_id: orderId })
    .orderBy('position')
    .select<BoxRow[]>({ id: 'id', serial: 'serial', versionId: 'version_id', state: 'state' });
  const contents = await sql('box_lines')
    .join('boxes', 'boxes.id', 'box_lines.box_id')
    .join('parts', 'parts.id', 'box_lines.part_id')
    .where({ 'boxes.order_id': orderId })
    .orderBy('box_lines.position')
    .select<ContentRow[]>({
      boxId: 'boxes.id',
      reference: 'box_lines.reference',
      name: 'parts.name',
      kind: 'parts.kind',
      quantity: 'box_lines.needed',
      unit: 'parts.unit',
    });
  return boxes.map((box) => ({
    id: BoxId.parse(box.id),
    serial: box.serial,
    versionId: VersionId.parse(box.versionId),
    state: box.state,
    contents: contents.flatMap(({ boxId, ...line }) => (boxId === box.id ? [line] : [])),
  }));
}

/** When the last part was picked and the last box closed, each only where nothing is left to do. */
export async function packingTimes(
  sql: Knex,
  orderId: string,
): Promise<{ pickedAt: number | null; packedAt: number | null }> {
  const open = await sql('boxes')
    .where({ order_id: orderId })
    .whereIn('state', ['to-pack', 'packing'])
    .select('id')
    .first<{ id: string } | undefined>();
  const missingPart = await sql('box_lines')
    .join('boxes', 'boxes.id', 'box_lines.box_id')
    .where({ 'boxes.order_id': orderId })
    .where('box_lines.packed', '<', sql.ref('box_lines.needed'))
    .select('box_lines.id')
    .first<{ id: string } | undefined>();
  const closed = await sql('boxes')
    .where({ order_id: orderId })
    .max({ at: 'closed_at' })
    .first<{ at: number | null } | undefined>();
  const picked = await sql('box_picks')
    .join('boxes', 'boxes.id', 'box_picks.box_id')
    .where({ 'boxes.order_id': orderId })
    .max({ at: 'box_picks.at' })
    .first<{ at: number | null } | undefined>();
  return { pickedAt: missingPart ? null : (picked?.at ?? null), packedAt: open ? null : (closed?.at ?? null) };
}
