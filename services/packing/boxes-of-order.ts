import type { Knex } from 'knex';
import { plateOf } from './box-view';
import { boxesOf } from './rows';
import type { BoxState, PlateView } from './schemas';

export interface OrderBox {
  id: string;
  serial: string;
  plate: PlateView;
  position: number;
  state: BoxState;
  closedAt: number | null;
}

/** A step for pages and mails of an order: its boxes as a buyer may see them, no packer and no lot. */
export async function boxesOfOrder(sql: Knex, orderId: string): Promise<OrderBox[]> {
  return (await boxesOf(sql, orderId)).map((box) => ({
    id: box.id,
    serial: box.serial,
    plate: plateOf(box),
    position: box.position,
    state: box.state,
    closedAt: box.closedAt,
  }));
}
