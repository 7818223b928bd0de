import type { Knex } from 'knex';
import type { BoxId } from '../ids';
import { plateOf } from './box-view';
import { boxesOf } from './rows';
import type { BoxState, PlateView } from './schemas';

export interface OrderBox {
  id: BoxId;
  serial: string;
  plate: PlateView;
  position: number;
  state: BoxState;
  closedAt: number | null;
}

/** A step for the desk, mails and the demo: an order's boxes without packer and lot. */
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
