import type { Knex } from 'knex';
import { type Actor, must } from '../access';
import type { OrderId } from '../ids';
import { reading } from '../record';
import { plateOf } from './box-view';
import { boxesOf, storedAddress } from './rows';
import type { DispatchView } from './schemas';

/** Packed orders that wait for the carrier, oldest first, and the last ones handed over. */
export async function readDispatch(actor: Actor): Promise<DispatchView> {
  must(actor, 'box.list');
  const sql = reading();
  const [waiting, sent] = [await packedOrders(sql), await lastSent(sql)];
  return {
    waiting: await Promise.all(
      waiting.map(async (order) => ({
        orderId: order.id,
        orderNumber: order.number,
        buyer: order.name,
        address: storedAddress(order.address),
        delivery: order.delivery ?? order.deliveryCode,
        boxes: (await boxesOf(sql, order.id)).map((box) => ({
          id: box.id,
          serial: box.serial,
          plate: plateOf(box),
          massMilligrams: box.weighedMilligrams ?? box.expectedMilligrams,
        })),
      })),
    ),
    sent: await Promise.all(
      sent.map(async ({ shipmentId, ...parcel }) => ({ ...parcel, serials: await serialsIn(sql, shipmentId) })),
    ),
  };
}

interface PackedOrder {
  id: OrderId;
  number: string;
  name: string;
  address: string;
  deliveryCode: string;
  delivery: string | null;
}

const packedOrders = (sql: Knex): Promise<PackedOrder[]> =>
  sql('orders')
    .leftJoin('delivery_methods', 'delivery_methods.code', 'orders.delivery_code')
    .where('orders.fulfilment', 'packed')
    .orderBy(['orders.paid_at', 'orders.id'])
    .limit(50)
    .select({
      id: 'orders.id',
      number: 'orders.number',
      name: 'orders.name',
      address: 'orders.address',
      deliveryCode: 'orders.delivery_code',
      delivery: 'delivery_methods.name',
    });

interface Parcel {
  shipmentId: string;
  orderId: OrderId;
  orderNumber: string;
  buyer: string;
  carrier: string;
  trackingNumber: string;
  at: number;
  by: string;
}

const lastSent = (sql: Knex): Promise<Parcel[]> =>
  sql('shipments')
    .join('orders', 'orders.id', 'shipments.order_id')
    .join('people', 'people.id', 'shipments.shipped_by')
    .orderBy([{ column: 'shipments.shipped_at', order: 'desc' }, 'shipments.id'])
    .limit(12)
    .select({
      shipmentId: 'shipments.id',
      orderId: 'orders.id',
      orderNumber: 'orders.number',
      buyer: 'orders.name',
      carrier: 'shipments.carrier',
      trackingNumber: 'shipments.tracking_number',
      at: 'shipments.shipped_at',
      by: 'people.name',
    });

const serialsIn = (sql: Knex, shipmentId: string): Promise<string[]> =>
  sql('boxes').where('shipment_id', shipmentId).orderBy('position').pluck('serial');
